package dev.estimation.filters.modelcheck;

/** What each method does by itself at each place: throwing, writing where it may not, leaving out, chance. */
final class Conduct {
  private final Examination examination;
  private final Ledger ledger;

  Conduct(Examination examination) {
    this.examination = examination;
    this.ledger = examination.ledger;
  }

  void look() {
    examination.subject.operations().forEach(operation -> {
      for (Arguments at : examination.places) {
        look(operation, at);
      }
    });
  }

  private void look(Operation operation, Arguments at) {
    Attempt first = Attempt.of(operation, at);
    if (first.threw()) {
      add(FindingKind.EXCEPTION, operation, "call", at, "must not throw, got " + first.thrown());
      return;
    }
    lookAtInput(operation, at, "state", at.state, first.in().state);
    lookAtInput(operation, at, "noise", at.noise, first.in().noise);
    String given = examination.subject.isSensor() ? "given" : "control";
    lookAtInput(operation, at, given, at.given, first.in().given);
    lookAtOutput(operation, at, first.out());
    lookForChance(operation, at);
  }

  private void add(
      FindingKind kind, Operation operation, String component, Arguments at, String message) {
    ledger.add(kind, operation, component, at, Double.NaN, Double.NaN, 0, message);
  }

  private void lookAtInput(
      Operation operation, Arguments at, String name, double[] before, double[] after) {
    for (int i = 0; i < before.length; i++) {
      if (Double.doubleToLongBits(before[i]) != Double.doubleToLongBits(after[i])) {
        String component = name + "[" + i + "]";
        ledger.add(
            FindingKind.INPUT_CHANGED,
            operation,
            component,
            at,
            before[i],
            after[i],
            Math.abs(after[i] - before[i]),
            component + " may only be read and must stay " + before[i] + ", got " + after[i]);
      }
    }
  }

  private void lookAtOutput(Operation operation, Arguments at, double[] out) {
    for (int i = 0; i < out.length; i++) {
      if (!Double.isFinite(out[i])) {
        String reason = operation.isVector() ? unfilled(operation, at, i) : null;
        FindingKind kind = reason == null ? FindingKind.NOT_FINITE : FindingKind.OUTPUT_UNFILLED;
        String message = reason == null ? " must be finite, got " + out[i] : reason;
        String entry = operation.entry(i);
        ledger.add(kind, operation, entry, at, Double.NaN, out[i], 0, entry + message);
      }
    }
  }

  /** What the model did not do with an output that is not finite; null if it is its own. */
  private static String unfilled(Operation operation, Arguments at, int i) {
    double[] low = operation.filledOutput(-2.25);
    double[] high = operation.filledOutput(1.5);
    if (Attempt.of(operation, at.copy(), low).threw()
        || Attempt.of(operation, at.copy(), high).threw()
        || Double.compare(low[i], high[i]) == 0) {
      return null;
    }
    return low[i] == -2.25 && high[i] == 1.5
        ? " must be filled, got what was there before"
        : " must be filled before it is read, got a result of what was there before";
  }

  /** The first of three calls only makes the other two alike. */
  private void lookForChance(Operation operation, Arguments at) {
    Attempt.of(operation, at);
    Attempt second = Attempt.of(operation, at).kept();
    Attempt third = Attempt.of(operation, at);
    if (!second.agrees(third)) {
      ledger.addDifference(
          FindingKind.NOT_DETERMINISTIC,
          operation,
          at,
          second,
          third,
          "as in the same call before");
    }
  }
}

package dev.estimation.filters.modelcheck;

import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;

/** Calls at one place, then at another: whether the earlier one is felt, and whether it is left alone. */
final class CallOrder {
  private static final int PAIRS = 40;

  private final Examination examination;
  private final List<Operation> operations;

  CallOrder(Examination examination) {
    this.examination = examination;
    this.operations = examination
        .subject
        .operations()
        .filter(each -> !examination.ledger.has(FindingKind.NOT_DETERMINISTIC, each))
        .collect(Collectors.toList());
  }

  void look() {
    for (int k = 0; k < Math.min(PAIRS, examination.places.size()); k++) {
      Arguments here = examination.places.get(k);
      for (Operation operation : operations) {
        look(operation, here, examination.after(k));
        look(operation, here, examination.places.get(0));
      }
    }
  }

  private void look(Operation operation, Arguments here, Arguments there) {
    for (Operation every : operations) {
      Attempt.of(every, here);
    }
    Attempt wanted = Attempt.of(operation, here).kept();
    for (Operation earlier : operations) {
      apart(operation, here, earlier, there, wanted);
      inSameArrays(operation, here, earlier, there, wanted);
    }
  }

  /** Each call in arrays of its own. */
  private void apart(
      Operation operation, Arguments here, Operation earlier, Arguments there, Attempt wanted) {
    Attempt before = Attempt.of(earlier, there);
    Arguments in = before.in().copy();
    double[] out = before.out().clone();
    compare(operation, here, earlier, wanted, Attempt.of(operation, here));
    int touched = Arrays.mismatch(out, before.out());
    if (touched >= 0) {
      report(
          operation,
          earlier.entry(touched),
          here,
          out[touched],
          before.out()[touched],
          earlier.entry(touched) + " of an earlier " + earlier.method() + " must stay "
              + out[touched] + ", got " + before.out()[touched]);
    } else if (!in.sameBits(before.in())) {
      report(
          operation,
          "state",
          here,
          Double.NaN,
          Double.NaN,
          "arrays of an earlier " + earlier.method() + " must stay as they are, got "
              + before.in().place());
    }
  }

  /** Both calls in the same arrays, as a filter calls. */
  private void inSameArrays(
      Operation operation, Arguments here, Operation earlier, Arguments there, Attempt wanted) {
    Arguments shared = there.copy();
    double[] out = operation.blankOutput();
    Attempt.of(earlier, shared, earlier == operation ? out : earlier.blankOutput());
    shared.set(here);
    operation.clear(out);
    compare(operation, here, earlier, wanted, Attempt.of(operation, shared, out));
  }

  private void compare(
      Operation operation, Arguments here, Operation earlier, Attempt wanted, Attempt got) {
    if (!wanted.agrees(got)) {
      String reason = "as before " + earlier.method() + " was called at another place";
      examination.ledger.addDifference(
          FindingKind.EARLIER_CALL, operation, here, wanted, got, reason);
    }
  }

  private void report(
      Operation operation, String entry, Arguments at, double wanted, double got, String message) {
    double badness = Math.abs(got - wanted);
    examination.ledger.add(
        FindingKind.EARLIER_CALL, operation, entry, at, wanted, got, badness, message);
  }
}

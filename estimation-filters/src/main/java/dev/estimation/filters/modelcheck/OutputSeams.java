package dev.estimation.filters.modelcheck;

/** Jumps of outputs by a full turn on the way from each place to the next, in components that are no angles. */
final class OutputSeams {
  private static final int PARTS = 6;
  private static final int HALVINGS = 45;
  private static final double FULL_TURN = 2 * Math.PI;
  private static final double TOLERANCE = 1e-4;

  private final Examination examination;
  private final View view;

  OutputSeams(Examination examination) {
    this.examination = examination;
    this.view = examination.view;
  }

  void look() {
    for (int k = 0; k < examination.places.size(); k++) {
      Arguments at = examination.places.get(k);
      double[] way = view.displacement(at, examination.after(k));
      double[] before = view.value(at);
      for (int part = 1; part <= PARTS; part++) {
        double[] value = view.value(view.moved(at, way, (double) part / PARTS));
        if (before != null && value != null) {
          look(at, way, part, before, value);
        }
        before = value;
      }
    }
  }

  private void look(Arguments at, double[] way, int part, double[] before, double[] value) {
    double[] change = view.change(value, before);
    for (int i = 0; i < change.length; i++) {
      if (Math.abs(change[i]) > Math.PI) {
        narrow(at, way, i, (part - 1.0) / PARTS, (double) part / PARTS, before, value);
      }
    }
  }

  /** Halves the way, keeping the larger change, while it may still hold a jump. */
  private void narrow(
      Arguments at, double[] way, int i, double from, double to, double[] before, double[] after) {
    double low = from;
    double high = to;
    double[] below = before;
    double[] above = after;
    for (int halving = 0; halving < HALVINGS; halving++) {
      double middle = (low + high) / 2;
      double[] value = view.value(view.moved(at, way, middle));
      if (value == null) {
        return;
      }
      if (Math.abs(view.change(above, value)[i]) > Math.abs(view.change(value, below)[i])) {
        low = middle;
        below = value;
      } else {
        high = middle;
        above = value;
      }
      if (Math.abs(view.change(above, below)[i]) < Math.PI) {
        return;
      }
    }
    judge(view.moved(at, way, low), i, view.change(above, below)[i], below, above);
  }

  private void judge(Arguments at, int i, double jump, double[] below, double[] above) {
    if (Math.abs(Math.abs(jump) - FULL_TURN) <= TOLERANCE) {
      String name = examination.outputName(i);
      String from = below.length > i ? " from " + below[i] + " to " + above[i] : "";
      examination.ledger.add(
          FindingKind.UNDECLARED_SEAM,
          examination.subject.function(),
          name,
          at,
          0,
          jump,
          0,
          name + " must not jump unless its space calls it an angle, got a jump of " + jump + from);
    }
  }
}

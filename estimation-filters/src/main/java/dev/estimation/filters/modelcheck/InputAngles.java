package dev.estimation.filters.modelcheck;

import dev.estimation.core.space.Space;

/** Whether the function gives the same for an angle of the state under both of its names. */
final class InputAngles {
  private static final double FULL_TURN = 2 * Math.PI;
  private static final double OF_CHANGE = 1e-6;
  private static final double OF_VALUE = 1e-9;
  private static final double SAME_POINT = 1e-9;

  private final Examination examination;
  private final Influence influence;
  private final Space space;

  InputAngles(Examination examination, Influence influence) {
    this.examination = examination;
    this.influence = influence;
    this.space = examination.subject.state();
  }

  void look() {
    for (int s = 0; s < space.storage(); s++) {
      if (isAngle(s)) {
        for (Arguments at : examination.places) {
          look(at, s);
        }
      }
    }
  }

  /** Whether a full turn of a number leads back to the same point of the space, at every place. */
  private boolean isAngle(int s) {
    double[] difference = new double[space.dimension()];
    for (Arguments at : examination.places) {
      double[] turned = at.state.clone();
      turned[s] += FULL_TURN;
      if (!space.contains(turned)) {
        return false;
      }
      space.difference(turned, at.state, difference);
      for (double each : difference) {
        if (Math.abs(each) > SAME_POINT) {
          return false;
        }
      }
    }
    return true;
  }

  /** Both the place itself and the seam must tell the difference: the one alone may lie outside what a model is for. */
  private void look(Arguments at, int s) {
    double angle = at.state[s];
    double other = angle > 0 ? angle - FULL_TURN : angle + FULL_TURN;
    double[] here = change(at, s, angle, other);
    double[] seam = change(at, s, -Math.PI, Math.nextDown(Math.PI));
    for (int i = 0; here != null && seam != null && i < here.length; i++) {
      double limit = OF_CHANGE * influence.largest(i) + OF_VALUE * influence.magnitude(i);
      if (Math.abs(here[i]) > limit && Math.abs(seam[i]) > limit) {
        report(at, s, i, angle, other, here[i]);
      }
    }
  }

  private double[] change(Arguments at, int s, double first, double second) {
    double[] one = value(at, s, first);
    double[] two = value(at, s, second);
    return one == null || two == null ? null : examination.view.change(two, one);
  }

  private double[] value(Arguments at, int s, double angle) {
    Arguments turned = at.copy();
    turned.state[s] = angle;
    return examination.view.value(turned);
  }

  private void report(Arguments at, int s, int i, double angle, double other, double change) {
    examination.ledger.add(
        FindingKind.ANGLE_NOT_PERIODIC,
        examination.subject.function(),
        "state[" + s + "]",
        at,
        0,
        change,
        Math.abs(change),
        "state[" + s + "] is an angle: " + other + " must give the same "
            + examination.outputName(i) + " as " + angle + ", got a change of " + change);
  }
}

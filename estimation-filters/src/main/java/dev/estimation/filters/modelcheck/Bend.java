package dev.estimation.filters.modelcheck;

/** How far outputs half way between two places are off the middle of those at the places, twice; 0 for what is linear. */
final class Bend {
  private static final double RELATIVE = 1e-9;
  private static final double ROUNDINGS = 100;
  private static final double ROUNDING = 64 * 0x1p-52;

  private final View view;
  private final Arguments middle;
  private final double[] value;
  private final double[] displacement;
  private final double[][] bend;
  private double[] rounding;

  private Bend(
      View view, Arguments middle, double[] value, double[] displacement, double[][] bend) {
    this.view = view;
    this.middle = middle;
    this.value = value;
    this.displacement = displacement;
    this.bend = bend;
  }

  /** From a place to another; null where anything is not finite. */
  static Bend between(View view, Arguments at, double[] displacement) {
    Arguments middle = view.moved(at, displacement, 0.5);
    double[] value = view.value(middle);
    double[][] bend = view.bend(middle, displacement, 0.5);
    return value == null || bend == null ? null : new Bend(view, middle, value, displacement, bend);
  }

  /** Whether that of an output is more than rounding. */
  boolean isReal(int i) {
    double known = RELATIVE * bend[1][i] + ROUNDING * view.size(value, i);
    if (Math.abs(bend[0][i]) <= known) {
      return false;
    }
    if (rounding == null) {
      rounding = view.rounding(middle, displacement);
    }
    return Math.abs(bend[0][i]) > known + ROUNDINGS * rounding[i];
  }

  boolean anyReal() {
    for (int i = 0; i < bend[0].length; i++) {
      if (isReal(i)) {
        return true;
      }
    }
    return false;
  }

  double amount(int i) {
    return bend[0][i];
  }

  double relative(int i) {
    return Math.abs(bend[0][i]) / bend[1][i];
  }
}

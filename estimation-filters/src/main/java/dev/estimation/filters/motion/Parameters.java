package dev.estimation.filters.motion;

/** Checks of what models are built with; the messages name the model and the parameter. */
final class Parameters {
  private Parameters() {}

  /** A copy of spectral densities, one or more, each finite and 0 or more. */
  static double[] densities(String what, double[] values) {
    if (values.length == 0) {
      throw new IllegalArgumentException(what + " must be given for 1 axis or more, got none");
    }
    for (int i = 0; i < values.length; i++) {
      notNegative(what + "[" + i + "]", values[i]);
    }
    return values.clone();
  }

  static double notNegative(String what, double value) {
    if (!(value >= 0 && value <= Double.MAX_VALUE)) {
      throw new IllegalArgumentException(what + " must be finite and >= 0, got " + value);
    }
    return value;
  }

  static double positive(String what, double value) {
    if (!(value > 0 && value <= Double.MAX_VALUE)) {
      throw new IllegalArgumentException(what + " must be finite and > 0, got " + value);
    }
    return value;
  }
}

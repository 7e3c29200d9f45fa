package dev.estimation.filters.filter;

import dev.estimation.core.internal.Checks;

/** Notices a number from outside that is not finite, and remembers which it was. */
final class InputCheck {
  private String name = "";
  private int index;
  private double value;

  boolean isFinite(String what, double[] values) {
    if (Checks.allFinite(values)) {
      return true;
    }
    int bad = Checks.firstNotFinite(values);
    name = what;
    index = bad;
    value = values[bad];
    return false;
  }

  String failure() {
    return name + "[" + index + "] must be finite, got " + value;
  }
}

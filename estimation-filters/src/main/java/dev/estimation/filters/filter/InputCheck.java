package dev.estimation.filters.filter;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;

/** Notices numbers from outside that are not finite or no point, and remembers which they were. */
final class InputCheck {
  private String name = "";
  private int index;
  private double value;
  private Space missed;

  boolean isFinite(String what, double[] values) {
    if (Checks.allFinite(values)) {
      return true;
    }
    missed = null;
    int bad = Checks.firstNotFinite(values);
    name = what;
    index = bad;
    value = values[bad];
    return false;
  }

  /** Whether finite numbers are a point of a space. */
  boolean isPoint(String what, double[] values, Space space) {
    if (space.contains(values)) {
      return true;
    }
    name = what;
    missed = space;
    return false;
  }

  String failure() {
    if (missed != null) {
      return name + " must be a point of " + missed + ", got numbers that are none";
    }
    return name + "[" + index + "] must be finite, got " + value;
  }
}

package dev.estimation.filters.modelcheck;

import dev.estimation.core.internal.Checks;

/** Numbers between a low and a high one, each with its own limits. Immutable. */
final class Range {
  private final double[] low;
  private final double[] high;

  private Range(double[] low, double[] high) {
    this.low = low;
    this.high = high;
  }

  static Range of(String name, double[] low, double[] high) {
    Checks.length("high " + name, high, low.length);
    Checks.finite("low " + name, low);
    Checks.finite("high " + name, high);
    for (int i = 0; i < low.length; i++) {
      if (!(low[i] <= high[i])) {
        throw new IllegalArgumentException("high " + name + "[" + i + "] must be " + low[i]
            + " or more, its low limit, got " + high[i]);
      }
    }
    return new Range(low.clone(), high.clone());
  }

  int size() {
    return low.length;
  }

  double low(int i) {
    return low[i];
  }

  double high(int i) {
    return high[i];
  }

  boolean isOpen(int i) {
    return low[i] < high[i];
  }

  double[] middle() {
    double[] middle = new double[low.length];
    for (int i = 0; i < low.length; i++) {
      middle[i] = at(i, 0);
    }
    return middle;
  }

  /** The number at -1 (low) to 1 (high), never outside. */
  double at(int i, double coordinate) {
    double value = low[i] / 2 + high[i] / 2 + coordinate * (high[i] / 2 - low[i] / 2);
    return Math.min(high[i], Math.max(low[i], value));
  }
}

package dev.estimation.benchmarks.page;

import dev.estimation.filters.consistency.ChiSquareBounds;
import java.util.HashMap;
import java.util.Map;

/** The two-sided 95 % bounds of normalised squares, each found once. */
final class Bounds {
  private static final double PROBABILITY = 0.95;

  private final Map<Integer, ChiSquareBounds> found = new HashMap<>();

  ChiSquareBounds of(int degrees) {
    return found.computeIfAbsent(degrees, d -> ChiSquareBounds.twoSided(PROBABILITY, d));
  }

  /** {@return {@code below}, {@code inside} or {@code above}; {@code unknown} if there is no value} */
  Verdict judge(double squared, int degrees) {
    ChiSquareBounds bounds = of(degrees);
    if (Double.isNaN(squared)) {
      return Verdict.UNKNOWN;
    }
    if (bounds.contains(squared)) {
      return Verdict.INSIDE;
    }
    return squared < bounds.lower() ? Verdict.BELOW : Verdict.ABOVE;
  }
}

package dev.estimation.benchmarks.replay;

import java.util.Optional;

/**
 * How a run compares with truth, over the steps that have truth.
 *
 * @param count of those steps; all numbers below are NaN if it is 0
 * @param position distances (m)
 * @param heading wrapped differences (rad); empty where truth tells none
 * @param degreesOfFreedom of each normalised error squared
 * @param neesMean mean of the normalised error squared
 * @param insideFraction share of them inside the two-sided 95 % bounds
 */
public record Accuracy(
    long count,
    Score position,
    Optional<Score> heading,
    int degreesOfFreedom,
    double neesMean,
    double insideFraction) {
  /** Nothing to compare with. */
  static final Accuracy NONE = new Accuracy(
      0, new Score(Double.NaN, Double.NaN), Optional.empty(), 0, Double.NaN, Double.NaN);
}

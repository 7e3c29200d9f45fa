package dev.estimation.benchmarks.replay;

/**
 * How a run compares with truth, over the steps that have truth.
 *
 * @param count of those steps; all numbers below are NaN if it is 0
 * @param rmse root of the mean squared distance (m)
 * @param max largest distance (m)
 * @param degreesOfFreedom of each normalised error squared
 * @param neesMean mean of the normalised error squared
 * @param insideFraction share of them inside the two-sided 95 % bounds
 */
public record Accuracy(
    long count,
    double rmse,
    double max,
    int degreesOfFreedom,
    double neesMean,
    double insideFraction) {
  /** Nothing to compare with. */
  static final Accuracy NONE = new Accuracy(0, Double.NaN, Double.NaN, 0, Double.NaN, Double.NaN);
}

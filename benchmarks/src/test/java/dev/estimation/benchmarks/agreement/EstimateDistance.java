package dev.estimation.benchmarks.agreement;

import dev.estimation.core.gaussian.Gaussian;

/**
 * How far two estimates are apart: differences of means in standard deviations, of covariances in
 * products of standard deviations; the largest over all entries, NaN if any is.
 */
final class EstimateDistance {
  private double largest;

  double largest() {
    return largest;
  }

  /**
   * Compares an estimate with an expected one.
   *
   * @param covariance expected, row by row, whole or upper triangle alone
   */
  void add(Gaussian actual, double[] mean, double[] covariance) {
    int n = actual.dimension();
    boolean whole = covariance.length == n * n;
    double[] deviation = new double[n];
    for (int i = 0, diagonal = 0; i < n; diagonal += whole ? n + 1 : n - i, i++) {
      deviation[i] = Math.sqrt(covariance[diagonal]);
      take((actual.mean(i) - mean[i]) / deviation[i]);
    }
    int entry = 0;
    for (int i = 0; i < n; i++) {
      for (int j = whole ? 0 : i; j < n; j++) {
        take((actual.covariance(i, j) - covariance[entry++]) / (deviation[i] * deviation[j]));
      }
    }
  }

  private void take(double difference) {
    largest = Math.max(largest, Math.abs(difference)); // NaN wins
  }
}

package dev.estimation.core.accuracy;

import dev.estimation.core.internal.Whitening;
import org.apache.commons.math3.distribution.ChiSquaredDistribution;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * Mardia's measures of multivariate skewness and kurtosis, and the tests by them: is a mean and covariance all
 * there is to say about an output, or is its cloud bent or heavy in the tails?
 *
 * <p>With N samples in d dimensions and y = S^-1/2 (z - mean), S their covariance (divisor N):
 *
 * <ul>
 *   <li>skewness b1 = 1/N^2 sum over all pairs (y_i' y_j)^3, computed as the sum of squares of the d^3 third
 *       moments of y. Gaussian: 0. N b1 / 6 is about chi-square with d (d + 1) (d + 2) / 6 degrees of freedom.
 *   <li>kurtosis b2 = 1/N sum |y_i|^4. Gaussian: d (d + 2). (b2 - d (d + 2) (N - 1) / (N + 1)) / sqrt(8 d
 *       (d + 2) / N) is about standard normal, both tails counting.
 * </ul>
 *
 * <p>The levels are asymptotic. With many samples a bend that matters to nobody is found too: look at b1 and b2
 * themselves for its size. Cost: N d^3 / 6 operations. <i>Immutable.</i> Source: Mardia 1970, <i>Measures of
 * multivariate skewness and kurtosis with applications</i>, Biometrika 57(3) (from memory).
 *
 * @param samples N
 * @param dimension d
 * @param skewness b1
 * @param skewnessLevel the probability that a Gaussian gives a larger b1
 * @param kurtosis b2
 * @param kurtosisLevel the probability that a Gaussian gives a b2 farther from its mean
 */
public record MardiaMeasures(
    int samples,
    int dimension,
    double skewness,
    double skewnessLevel,
    double kurtosis,
    double kurtosisLevel) {

  /**
   * The test of a sampled output.
   *
   * @param output independent samples
   * @return its result
   * @throws IllegalArgumentException if the covariance of the samples is not positive definite
   */
  public static MardiaMeasures of(SampledOutput output) {
    DMatrixRMaj covariance = output.covariance();
    double n = output.count();
    CommonOps_DDRM.scale((n - 1) / n, covariance);
    Whitening whitening = new Whitening(covariance);
    if (!whitening.isDefinite()) {
      throw new IllegalArgumentException(
          "samples must have a positive definite covariance for a test of shape, got "
              + whitening.failure() + " (leave out components that do not vary)");
    }
    int d = covariance.numRows;
    double[] thirds = new double[d * d * d];
    double fourth = 0;
    double[] y = new double[d];
    for (int i = 0; i < output.count(); i++) {
      output.fillDeviation(i, y);
      whitening.solve(y);
      fourth += addMoments(y, thirds, n);
    }
    return of(output.count(), d, skewness(thirds, d), fourth);
  }

  private static MardiaMeasures of(int samples, int d, double skewness, double kurtosis) {
    double n = samples;
    double freedom = d * (d + 1.0) * (d + 2.0) / 6;
    double upper =
        1 - new ChiSquaredDistribution(null, freedom).cumulativeProbability(n * skewness / 6);
    double expected = d * (d + 2.0) * (n - 1) / (n + 1);
    double distance = Math.abs(kurtosis - expected) / Math.sqrt(8.0 * d * (d + 2) / n);
    double outside = 2 * new NormalDistribution(null, 0, 1).cumulativeProbability(-distance);
    return new MardiaMeasures(samples, d, skewness, upper, kurtosis, outside);
  }

  /** Adds y_a y_b y_c / n for a >= b >= c; returns |y|^4 / n. */
  private static double addMoments(double[] y, double[] thirds, double n) {
    int d = y.length;
    double square = 0;
    for (int a = 0; a < d; a++) {
      square += y[a] * y[a];
      for (int b = 0; b <= a; b++) {
        double product = y[a] * y[b] / n;
        for (int c = 0; c <= b; c++) {
          thirds[(a * d + b) * d + c] += product * y[c];
        }
      }
    }
    return square * square / n;
  }

  /** The sum of squares over all orders of a, b and c. */
  private static double skewness(double[] thirds, int d) {
    double sum = 0;
    for (int a = 0; a < d; a++) {
      for (int b = 0; b <= a; b++) {
        for (int c = 0; c <= b; c++) {
          double third = thirds[(a * d + b) * d + c];
          int orders = a == b && b == c ? 1 : a == b || b == c ? 3 : 6;
          sum += orders * third * third;
        }
      }
    }
    return sum;
  }

  /**
   * Whether the samples do not look Gaussian: one of the two levels is below half of the probability given, so that a
   * Gaussian is rejected with about that probability at most.
   *
   * @param falseAlarm above 0 and below 1
   * @return whether
   */
  public boolean rejects(double falseAlarm) {
    if (!(falseAlarm > 0 && falseAlarm < 1)) {
      throw new IllegalArgumentException(
          "false-alarm probability must be above 0 and below 1, got " + falseAlarm);
    }
    return skewnessLevel < falseAlarm / 2 || kurtosisLevel < falseAlarm / 2;
  }
}

package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Affine maps, exact by algebra, where covariances are hard. */
interface ConditioningChecks extends MatchingUnderTest {
  /**
   * Two inputs that differ by 1.4e-6 at most in standard deviation. Tolerance relative to the sum
   * of absolute terms, 4, as for any factorisation: the variance of the difference is rounding
   * below it.
   */
  @Test
  default void nearlySingularCovariances() {
    for (double gap : new double[] {1e-6, 1e-12, 1e-15, 0}) {
      double correlation = 1 - gap;
      Gaussian value =
          Gaussian.of(new double[2], new double[][] {{1, correlation}, {correlation, 1}});
      AffineFunction function =
          new AffineFunction(DMatrixRMaj.wrap(2, 2, new double[] {1, 1, 1, -1}), 0, 0);
      MatchingWorkspace work =
          formed(1, 1).workspace(Space.reals(2), Space.reals(2), offered(function));
      Outcome outcome = Outcome.of(work, RandomGaussians.momentsOf(value));
      double rounding = covarianceRounding(2, 1, 1);
      DMatrixRMaj got = outcome.covariance;
      assertWithin("sum", 2 + 2 * correlation, got.get(0, 0), rounding, 4);
      assertWithin("difference", 2 - 2 * correlation, got.get(1, 1), rounding, 4);
      assertWithin("sum and difference", 0, got.get(0, 1), rounding, 4);
      assertTrue(got.get(1, 1) >= 0, "no negative variance");
    }
  }

  /** Variances from 1e-6 to 1e6: each entry is relative to its own row and column. */
  @Test
  default void dynamicRangeOfVariances() {
    int n = 4;
    double[] deviation = {1e3, 1e-3, 1, 30};
    RandomGaussians random = new RandomGaussians(61);
    DMatrixRMaj covariance = random.covariance(n);
    DMatrixRMaj matrix = random.matrix(n, n);
    double[] mean = random.vector(n);
    for (int i = 0; i < n; i++) {
      mean[i] *= deviation[i];
      for (int j = 0; j < n; j++) {
        covariance.set(i, j, covariance.get(i, j) * deviation[i] * deviation[j]);
        matrix.set(i, j, matrix.get(i, j) * deviation[i] / deviation[j]);
      }
    }
    Moments input = RandomGaussians.momentsOf(Gaussian.of(mean, covariance));
    MatchingWorkspace work = formed(deviation)
        .workspace(
            Space.reals(n), Space.reals(n), offered(new AffineFunction(matrix, new double[n])));
    Outcome outcome = Outcome.of(work, input);
    DMatrixRMaj wanted =
        new AffineProblem(matrix, new double[n], input, null).covarianceWithoutNoise();
    // Every input and output has about the size of its own deviation: ten of them at most.
    double rounding = covarianceRounding(n, 10, 1);
    assertCovariance("covariance", wanted, outcome.covariance, rounding);
  }

  /** Means far from zero, in standard deviations: digits are lost in proportion. */
  @Test
  default void hugeOffsets() {
    for (double size = 1e3; size <= largestOffset(); size *= 1e3) {
      RandomGaussians random = new RandomGaussians(71);
      double[] mean = {size, -size, size};
      Moments input = RandomGaussians.momentsOf(Gaussian.of(mean, random.covariance(3)));
      AffineProblem problem = new AffineProblem(
          random.matrix(2, 3), new double[] {size, -2 * size}, input, random.covariance(2));
      problem.check(this, 1, 1, 1);
    }
  }
}

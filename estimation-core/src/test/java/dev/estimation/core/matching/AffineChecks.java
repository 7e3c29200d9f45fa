package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Every matching is exact for affine functions: algebra, up to rounding. */
interface AffineChecks extends MatchingUnderTest {
  @Test
  default void affineMapsWithNoiseAreExact() {
    for (int n = 1; n <= largestDimension(); n++) {
      for (int m = 1; m <= 5; m++) {
        RandomGaussians random = new RandomGaussians(1000L * n + m);
        problem(random, n, m, random.covariance(m)).check(this, MatchingUnderTest.unitScales(n));
      }
    }
  }

  @Test
  default void affineMapsWithoutNoiseAreExact() {
    for (int n = 1; n <= largestDimension(); n++) {
      RandomGaussians random = new RandomGaussians(77 + n);
      problem(random, n, 3, null).check(this, MatchingUnderTest.unitScales(n));
    }
  }

  private static AffineProblem problem(RandomGaussians random, int n, int m, DMatrixRMaj noise) {
    Moments input = random.moments(n);
    return new AffineProblem(random.matrix(m, n), random.vector(m), input, noise);
  }
}

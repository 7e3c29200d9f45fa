package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Components that are known exactly are valid input. */
interface ZeroVarianceChecks extends MatchingUnderTest {
  @Test
  default void affineMapsWithSomeVariancesZeroAreExact() {
    int n = Math.min(5, largestDimension());
    for (int zeros = 1; zeros < (1 << n) - 1; zeros++) {
      RandomGaussians random = new RandomGaussians(31L * zeros);
      Moments input = RandomGaussians.momentsOf(frozen(random.gaussian(n), zeros));
      AffineProblem problem =
          new AffineProblem(random.matrix(2, n), random.vector(2), input, random.covariance(2));
      problem.check(this, MatchingUnderTest.unitScales(n));
    }
  }

  /** The Gaussian with rows and columns of the components in a bit set replaced by zeros. */
  static Gaussian frozen(Gaussian value, int zeros) {
    DMatrixRMaj covariance = value.covariance();
    for (int i = 0; i < covariance.numRows; i++) {
      for (int j = 0; j < covariance.numCols; j++) {
        if ((zeros >> i & 1) == 1 || (zeros >> j & 1) == 1) {
          covariance.set(i, j, 0);
        }
      }
    }
    return Gaussian.of(value.mean(), covariance);
  }

  /** No point moves, so nothing is rounded: the same bits. */
  @Test
  default void allVariancesZeroGiveTheImageAndTheNoise() {
    int n = Math.min(4, largestDimension());
    RandomGaussians random = new RandomGaussians(5);
    double[] given = {0.25};
    Moments input = RandomGaussians.momentsOf(frozen(random.gaussian(n), (1 << n) - 1));
    BentFunction function = new BentFunction(n, 3, 6);
    DMatrixRMaj noise = random.covariance(3);
    MatchingWorkspace work = formed(MatchingUnderTest.unitScales(n))
        .workspace(Space.reals(n), Space.reals(3), offered(function));
    Outcome outcome = Outcome.of(work, input, given, noise);
    double[] image = new double[3];
    function.evaluate(input.mean(), given, image);
    assertSameBits("mean", image, outcome.mean);
    // In square-root form the factor of the noise, squared: 1e-14, a few roundings.
    assertSame("covariance", noise, outcome.covariance, 1e-14);
    DMatrixRMaj cross = outcome.cross();
    for (int i = 0; i < cross.getNumElements(); i++) {
      assertEquals(0, Math.abs(cross.data[i]), "cross-covariance entry " + i);
    }
  }
}

package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Unscented points at a given number of standard deviations. */
class DeviationsTest {
  /** By definition: +-s, 1 / (2 s^2), 1 - n / s^2; a rounding or two. */
  @ParameterizedTest
  @ValueSource(doubles = {0.01, 1, 1.5, 2, 3})
  void pointsAndWeightsAreThoseOfTheDefinition(double s) {
    for (int n = 1; n <= 12; n++) {
      UnitPoints points = UnscentedRule.atDeviations(s).points(n);
      assertEquals(2 * n, points.size());
      assertEquals(s, points.coordinate(n - 1, n - 1), 2 * Math.ulp(s));
      assertEquals(1 / (2 * s * s), points.weight(0), 1e-15 / (s * s));
      assertWithin("n = " + n, 1 - n / (s * s), points.centreMeanWeight(), 1e-15, 1 + n / (s * s));
    }
  }

  /**
   * The variance of the square of one component: s^2 + max(2 - s^2, -s^2 / n) by the formula, and 2 exactly
   * while s^2 is at most 2 n / (n - 1). 1e-13: sums of 24 numbers.
   */
  @ParameterizedTest
  @ValueSource(doubles = {0.1, 1, Math.PI / 2, 2, 3})
  void theVarianceOfASquareIsExactWhereItCanBe(double s) {
    for (int n = 1; n <= 12; n++) {
      boolean exact = n == 1 || s * s <= 2.0 * n / (n - 1);
      double wanted = exact ? 2 : s * s * (1 - 1.0 / n);
      assertWithin(
          "n = " + n, wanted, varianceOfSquare(UnscentedRule.atDeviations(s), n), 1e-13, 1);
    }
  }

  private static double varianceOfSquare(PointRule rule, int n) {
    double[] ones = new double[n];
    Arrays.fill(ones, 1);
    Moments input = RandomGaussians.momentsOf(Gaussian.independent(new double[n], ones));
    MatchingWorkspace work = PointMatching.of(rule)
        .workspace(Space.reals(n), Space.reals(1), (u, given, z) -> z[0] = u[n - 1] * u[n - 1]);
    work.carry(input, new double[0], null);
    return work.output().covariance().get(0, 0);
  }

  /** Algebra; rounding of s^2. */
  @Test
  void rootThreeIsKappaThreeMinusDimensionToThreeDimensions() {
    for (int n = 1; n <= 3; n++) {
      UnitPoints points = UnscentedRule.atDeviations(Math.sqrt(3)).points(n);
      UnitPoints kappa = UnscentedRule.symmetric(k -> 3 - k).points(n);
      assertWithin("mean", kappa.centreMeanWeight(), points.centreMeanWeight(), 1e-15, 1);
      double covariance = points.centreCovarianceWeight();
      assertWithin("covariance", kappa.centreCovarianceWeight(), covariance, 2e-15, 1);
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, -1, Double.NaN, Double.POSITIVE_INFINITY})
  void deviationsMustBeFiniteAndAboveZero(double s) {
    String message = assertThrows(
            IllegalArgumentException.class, () -> UnscentedRule.atDeviations(s))
        .getMessage();
    assertNames(message, "standard deviations", Double.toString(s));
  }
}

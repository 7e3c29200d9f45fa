package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What parameters do, which are refused, and what the refusal says. */
class RuleParametersTest {
  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, -0.5, Double.NaN, Double.POSITIVE_INFINITY})
  void alphaMustBeFiniteAndAboveZero(double alpha) {
    assertRefused(() -> UnscentedRule.scaled(alpha, 2, 0), "alpha", Double.toString(alpha));
    assertRefused(
        () -> UnscentedRule.scaled(alpha, 2, n -> 3 - n), "alpha", Double.toString(alpha));
  }

  @Test
  void betaAndKappaMustBeFinite() {
    assertRefused(() -> UnscentedRule.scaled(1, Double.NaN, 0), "beta", "NaN");
    assertRefused(() -> UnscentedRule.scaled(1, 2, Double.NaN), "kappa", "NaN");
    assertRefused(() -> UnscentedRule.scaled(1, 2, Double.NEGATIVE_INFINITY), "kappa", "-Infinity");
  }

  @Test
  void dimensionPlusKappaMustBeAboveZero() {
    assertRefused(() -> UnscentedRule.scaled(1, 0, -3).points(3), "n + kappa", "3", "-3.0");
    assertRefused(() -> UnscentedRule.scaled(1, 0, -4.5).points(3), "n + kappa", "3", "-4.5");
    assertRefused(() -> UnscentedRule.scaled(1, 0, n -> Double.NaN).points(2), "2", "NaN");
    assertEquals(6, UnscentedRule.scaled(1, 0, -2.5).points(3).size());
  }

  @ParameterizedTest
  @ValueSource(ints = {-1, 0, 1, 101})
  void nodesPerAxisAreFromTwoToOneHundred(int nodes) {
    assertRefused(() -> GaussHermiteRule.product(nodes), "from 2 to 100", Integer.toString(nodes));
  }

  /** The counts are p^n: 10^6, 3^11, 2^17 and 7^6; the largest allowed ones are 10^5 and 2^16. */
  @ParameterizedTest
  @CsvSource({"10, 6, 1000000", "3, 11, 177147", "2, 17, 131072", "7, 6, 117649"})
  void tooManyPointsAreRefusedWithTheirCount(int nodes, int dimension, String count) {
    assertRefused(
        () -> GaussHermiteRule.product(nodes).points(dimension),
        count,
        "100000",
        nodes + " nodes",
        dimension + " axes");
  }

  @Test
  void theCountIsNamedEvenBeyondLong() {
    assertRefused(() -> GaussHermiteRule.product(100).points(40), "1.0E80", "100000");
    assertRefused(() -> CubatureRule.degreeThree().points(60_000), "120001", "100000");
    assertRefused(() -> UnscentedRule.scaled(1, 2, 0).points(60_000), "120001", "100000");
    assertRefused(() -> UnscentedRule.atDeviations(1).points(60_000), "120001", "100000");
    assertRefused(() -> CubatureRule.degreeFive().points(224), "100353", "100000", "224 axes");
    assertRefused(() -> CubatureRule.mcNameeStenger().points(50_000), "5000000001", "100000");
    assertRefused(() -> SimplexRule.spherical().points(100_000), "100002", "100000");
    assertRefused(() -> GaussHermiteRule.product(50, 41, 49).points(3), "100450", "50, 41, 49");
    double[][] own = new double[100_001][1];
    assertRefused(() -> UnitPoints.of(1, 0, 0, own, new double[100_001]), "100001", "100000");
  }

  @Test
  void oneHundredThousandPointsAreAllowed() {
    UnitPoints points = GaussHermiteRule.product(10).points(5);
    assertEquals(UnitPoints.LARGEST_SIZE, points.size());
  }

  /**
   * The whole range of nodes: a sum of p terms near 1, and second moments of terms to size 14^2 w.
   */
  @Test
  void everyNumberOfNodesGivesTheMomentsOfOneAxis() {
    for (int p = 2; p <= 100; p++) {
      UnitPoints points = GaussHermiteRule.product(p).points(1);
      double sum = points.centreMeanWeight() + UnitMoments.of(points, new int[] {0});
      assertWithin("weights, p = " + p, 1, sum, 2e-13, 1);
      assertWithin("variance, p = " + p, 1, UnitMoments.of(points, new int[] {2}), 2e-13, 1);
      double fourth = p == 2 ? 1 : 3;
      assertWithin("kurtosis, p = " + p, fourth, UnitMoments.of(points, new int[] {4}), 1e-12, 1);
    }
  }

  /** Common practice: with beta = 2 and kappa = 0 the points lie at alpha sqrt(n). */
  @ParameterizedTest
  @CsvSource({"1, 1", "1, 4", "0.5, 3", "0.1, 6", "1e-3, 2", "1e-3, 12", "1e-4, 5"})
  void spreadIsAlphaTimesTheRootOfTheDimension(double alpha, int n) {
    UnitPoints points = UnscentedRule.scaled(alpha, 2, 0).points(n);
    // Two roundings and a square root.
    assertRelative("spread", alpha * Math.sqrt(n), points.coordinate(0, 0), 4 * 0x1p-52);
  }

  /** Common practice: the centre's weight is often negative; for kappa = 3 - n it is 1 - n / 3. */
  @Test
  void theCentreIsNegativeAboveThreeDimensions() {
    for (int n = 1; n <= 12; n++) {
      UnitPoints points = UnscentedRule.scaled(1, 0, k -> 3 - k).points(n);
      assertEquals(n > 3, points.centreMeanWeight() < 0, "n = " + n);
      assertWithin("n = " + n, 1 - n / 3.0, points.centreMeanWeight(), 1e-15, 4);
    }
    assertTrue(UnscentedRule.scaled(1e-3, 2, 0).points(2).centreMeanWeight() < -999_998);
  }

  /**
   * By its formula: 2 / alpha^2 - 1 for kappa = 0 and alpha below 1; 1e-14: sums of 2 n + 1 terms.
   */
  @ParameterizedTest
  @ValueSource(doubles = {0.5, 0.1, 1e-3, 1e-4})
  void amplificationOfTheScaledRule(double alpha) {
    for (int n : new int[] {1, 2, 7}) {
      double amplification = UnscentedRule.scaled(alpha, 2, 0).points(n).weightAmplification();
      assertRelative("n = " + n, 2 / (alpha * alpha) - 1, amplification, 1e-14);
    }
  }

  /** Algebra: alpha = 1, beta = 0, kappa = 0 is the third-degree cubature rule, bit for bit. */
  @Test
  void theUnscentedRuleWithoutSpreadParametersIsTheCubatureRule() {
    for (int n = 1; n <= 12; n++) {
      assertEquals(
          UnitMoments.bits(CubatureRule.degreeThree().points(n)),
          UnitMoments.bits(UnscentedRule.scaled(1, 0, 0).points(n)));
    }
  }

  /** Algebra: on one axis, kappa = 2 is the Gauss-Hermite rule of 3 nodes; a few roundings. */
  @Test
  void kappaTwoOnOneAxisIsGaussHermiteThree() {
    UnitPoints unscented = UnscentedRule.scaled(1, 0, 2).points(1);
    UnitPoints product = GaussHermiteRule.product(3).points(1);
    assertWithin("centre", 2 / 3.0, product.centreMeanWeight(), 1e-15, 1);
    assertWithin("centre", product.centreMeanWeight(), unscented.centreMeanWeight(), 1e-15, 1);
    double spread = Math.abs(product.coordinate(0, 0));
    assertWithin("spread", spread, Math.abs(unscented.coordinate(0, 0)), 1e-15, 1);
    assertWithin("weight", product.weight(0), unscented.weight(0), 1e-15, 1);
  }

  /**
   * Algebra: with V = n / (alpha^2 (n + kappa)), beta - alpha^2 + 1 / V = beta + alpha^2 kappa / n decides
   * whether covariances can turn indefinite. Numbers away from zero, or zero with exact arithmetic.
   */
  @ParameterizedTest
  @CsvSource({
    "1, 0, 0",
    "1, 0, 1",
    "1, 0, -1",
    "1, 1, -1",
    "0.5, 0, 0",
    "0.5, 0.1, -1",
    "0.5, -0.1, 0",
    "1e-3, 2, 0",
    "1e-3, -1, 0"
  })
  void betaAndKappaDecideWhetherCovariancesCanTurnIndefinite(
      double alpha, double beta, double kappa) {
    for (int n = 2; n <= 4; n++) {
      UnitPoints points = UnscentedRule.scaled(alpha, beta, kappa).points(n);
      boolean never = beta + alpha * alpha * kappa / n >= 0;
      assertEquals(never, points.covarianceWeightsPositive(), "n = " + n);
    }
  }
}

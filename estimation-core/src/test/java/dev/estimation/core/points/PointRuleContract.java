package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import org.junit.jupiter.api.Test;

/** What every point rule owes: the moments of N(0, I), symmetry, and the truth about itself. */
abstract class PointRuleContract {
  private static final double EPSILON = 0x1p-52;

  /** The rule. */
  abstract PointRule rule();

  /** All monomials to this total degree are exact, with the weights of means; one above is not. */
  int degree(int dimension) {
    return 3;
  }

  /** The sum of the covariance weights; 1 unless the centre has another weight there. */
  double covarianceWeightSum(int dimension) {
    return 1;
  }

  /** Whether no function can have an indefinite covariance. */
  boolean neverIndefinite(int dimension) {
    return true;
  }

  /** The sum of the absolute weights of means; 1 if none is negative. */
  double amplification(int dimension) {
    return 1;
  }

  /** Whether exchanging two axes gives the same points. */
  boolean axesAlike(int dimension) {
    return true;
  }

  /** Whether every point has its mirror image. */
  boolean mirrored(int dimension) {
    return true;
  }

  /** The largest dimension that is tried. */
  int largestDimension() {
    return 12;
  }

  /**
   * Rounding of a sum of N terms of total size A: each term carries a few eps of its own, and
   * errors of random sign add up as sqrt(N). 16 (4 + sqrt N) eps A is some ten times what is
   * expected.
   */
  private static double tolerance(UnitPoints points) {
    return 16 * (4 + Math.sqrt(points.size())) * EPSILON * points.weightAmplification();
  }

  /** Common practice: mean weights sum to 1. */
  @Test
  void meanWeightsSumToOne() {
    for (int n = 1; n <= largestDimension(); n++) {
      UnitPoints points = rule().points(n);
      double sum = points.centreMeanWeight() + UnitMoments.of(points, new int[n]);
      assertWithin("weights for n = " + n, 1, sum, tolerance(points), 1);
    }
  }

  @Test
  void covarianceWeightsSumAsStated() {
    for (int n = 1; n <= largestDimension(); n++) {
      UnitPoints points = rule().points(n);
      double sum = points.centreCovarianceWeight() + UnitMoments.of(points, new int[n]);
      assertWithin("weights for n = " + n, covarianceWeightSum(n), sum, tolerance(points), 1);
    }
  }

  @Test
  void meanIsZeroAndCovarianceIsTheIdentity() {
    for (int n = 1; n <= largestDimension(); n++) {
      UnitPoints points = rule().points(n);
      for (int i = 0; i < n; i++) {
        int[] powers = new int[n];
        powers[i]++;
        assertWithin("mean, n = " + n, 0, UnitMoments.of(points, powers), tolerance(points), 1);
        for (int j = 0; j < n; j++) {
          int[] pair = powers.clone();
          pair[j]++;
          double wanted = i == j ? 1 : 0;
          double got = UnitMoments.of(points, pair);
          assertWithin("covariance, n = " + n, wanted, got, tolerance(points), 1);
        }
      }
    }
  }

  @Test
  void theDegreeIsTheOneStated() {
    for (int n = 1; n <= largestDimension(); n++) {
      UnitPoints points = rule().points(n);
      assertEquals(degree(n), points.degree(), "degree for n = " + n);
      DegreeCheck.checkExactTo(points, points.degree());
    }
    for (int n = 1; n <= Math.min(6, largestDimension()); n++) {
      DegreeCheck.firstFailing(rule().points(n), degree(n));
    }
  }

  @Test
  void axesAreAlikeIfStated() {
    for (int n = 2; n <= Math.min(5, largestDimension()); n++) {
      UnitPoints points = rule().points(n);
      assertEquals(axesAlike(n), SymmetryCheck.axesAlike(points), "n = " + n);
    }
  }

  @Test
  void pointsHaveMirrorImagesIfStated() {
    for (int n = 1; n <= Math.min(5, largestDimension()); n++) {
      UnitPoints points = rule().points(n);
      assertEquals(mirrored(n), SymmetryCheck.mirrored(points), "n = " + n);
    }
  }

  @Test
  void covarianceWeightsArePositiveIfStated() {
    for (int n = 1; n <= largestDimension(); n++) {
      boolean stated = rule().points(n).covarianceWeightsPositive();
      assertEquals(neverIndefinite(n), stated, "n = " + n);
    }
    for (int n = 1; n <= Math.min(6, largestDimension()); n++) {
      DefinitenessCheck.check(rule().points(n));
    }
  }

  @Test
  void affineMapsAreExact() {
    for (int n = 1; n <= largestDimension(); n++) {
      CarryCheck.affineMapIsExact(rule().points(n));
    }
  }

  @Test
  void inputsAreUntouchedAndResultsRepeat() {
    for (int n = 1; n <= Math.min(6, largestDimension()); n++) {
      CarryCheck.inputIsUntouchedAndResultsRepeat(rule().points(n));
    }
  }

  @Test
  void theSameBitsComeEachTime() {
    for (int n = 1; n <= Math.min(8, largestDimension()); n++) {
      assertEquals(UnitMoments.bits(rule().points(n)), UnitMoments.bits(rule().points(n)));
    }
  }

  @Test
  void theCentreIsApartFromThePoints() {
    for (int n = 1; n <= largestDimension(); n++) {
      UnitPoints points = rule().points(n);
      assertEquals(n, points.dimension());
      for (int i = 0; i < points.size(); i++) {
        assertNotEquals(points.start(i), points.start(i + 1), "point " + i + " has a coordinate");
      }
    }
  }

  @Test
  void weightAmplificationIsTheOneStated() {
    for (int n = 1; n <= largestDimension(); n++) {
      UnitPoints points = rule().points(n);
      double wanted = amplification(n);
      assertWithin("n = " + n, wanted, points.weightAmplification(), tolerance(points), 1);
    }
  }
}

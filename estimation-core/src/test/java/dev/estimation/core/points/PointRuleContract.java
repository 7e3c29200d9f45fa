package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** What every point rule owes: the moments of N(0, I), symmetry, and the truth about itself. */
abstract class PointRuleContract {
  private static final double EPSILON = 0x1p-52;

  /** The rule. */
  abstract PointRule rule();

  /** All monomials to this total degree are exact, with the weights of means. */
  int degree() {
    return 3;
  }

  /** The sum of the covariance weights; 1 unless the centre has another weight there. */
  double covarianceWeightSum() {
    return 1;
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
      assertWithin("weights for n = " + n, covarianceWeightSum(), sum, tolerance(points), 1);
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
  void monomialsToTheDegreeAreExact() {
    for (int n = 1; n <= Math.min(4, largestDimension()); n++) {
      DegreeCheck.checkExactTo(rule().points(n), degree());
    }
  }

  @Test
  void exchangingTwoAxesGivesTheSamePoints() {
    for (int n = 2; n <= Math.min(5, largestDimension()); n++) {
      UnitPoints points = rule().points(n);
      Map<List<Double>, Double> weights = byPlace(points);
      for (int axis = 1; axis < n; axis++) {
        for (int i = 0; i < points.size(); i++) {
          double[] place = UnitMoments.place(points, i);
          double kept = place[axis];
          place[axis] = place[0];
          place[0] = kept;
          assertSameWeight(weights, place, points.weight(i));
        }
      }
    }
  }

  @Test
  void mirroringGivesTheSamePoints() {
    for (int n = 1; n <= Math.min(5, largestDimension()); n++) {
      UnitPoints points = rule().points(n);
      Map<List<Double>, Double> weights = byPlace(points);
      for (int i = 0; i < points.size(); i++) {
        double[] place = UnitMoments.place(points, i);
        for (int axis = 0; axis < n; axis++) {
          place[axis] = -place[axis];
        }
        assertSameWeight(weights, place, points.weight(i));
      }
    }
  }

  private static Map<List<Double>, Double> byPlace(UnitPoints points) {
    Map<List<Double>, Double> weights = new HashMap<>();
    for (int i = 0; i < points.size(); i++) {
      weights.put(UnitMoments.key(UnitMoments.place(points, i)), points.weight(i));
    }
    assertEquals(points.size(), weights.size(), "all points distinct");
    return weights;
  }

  /** A product of n weights is rounded n - 1 times, in another order: 2 n eps with n up to 5. */
  private static void assertSameWeight(
      Map<List<Double>, Double> weights, double[] place, double wanted) {
    Double found = weights.get(UnitMoments.key(place));
    assertTrue(found != null, () -> "no point at " + UnitMoments.key(place));
    assertWithin("weight", wanted, found, 10 * EPSILON, Math.abs(wanted));
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

  /** By definition: what rounding of +-1 with the worst signs does to a mean. Sum order differs. */
  @Test
  void weightAmplificationIsTheWorstCase() {
    for (int n = 1; n <= largestDimension(); n++) {
      UnitPoints points = rule().points(n);
      double worst = Math.abs(points.centreMeanWeight());
      for (int i = points.size() - 1; i >= 0; i--) {
        worst += points.weight(i) * Math.signum(points.weight(i));
      }
      double tolerance = 4 * (4 + Math.sqrt(points.size())) * EPSILON;
      assertWithin("n = " + n, worst, points.weightAmplification(), tolerance, worst);
      assertTrue(points.weightAmplification() >= 1 - tolerance, "never below the sum of weights");
    }
  }
}

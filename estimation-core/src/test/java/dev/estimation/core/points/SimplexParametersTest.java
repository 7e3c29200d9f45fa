package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertRelative;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The weight of the simplex rule's centre: what it does, which are refused. */
class SimplexParametersTest {
  @ParameterizedTest
  @ValueSource(doubles = {1, 1.5, Double.NaN, Double.NEGATIVE_INFINITY})
  void theCentreMustBeFiniteAndBelowOne(double weight) {
    String message = assertThrows(
            IllegalArgumentException.class, () -> SimplexRule.spherical(weight))
        .getMessage();
    assertNames(message, "weight of the centre", Double.toString(weight));
  }

  /** By its formula: all corners at sqrt(n / (1 - w_0)), all of equal weight; tens of roundings. */
  @ParameterizedTest
  @ValueSource(doubles = {-2, 0, 0.3, 0.9})
  void cornersLieOnASphere(double centre) {
    for (int n = 1; n <= 12; n++) {
      UnitPoints points = SimplexRule.spherical(centre).points(n);
      for (int i = 0; i < points.size(); i++) {
        assertEquals(points.weight(0), points.weight(i));
        assertRelative("square", n / (1 - centre), squaredLength(points, i), 1e-14);
      }
    }
  }

  /** Moments of chi-square: the fourth moment of the distance is n (n + 2). */
  @Test
  void withoutAWeightGivenTheFourthMomentOfTheDistanceIsExact() {
    for (int n = 1; n <= 12; n++) {
      UnitPoints points = SimplexRule.spherical().points(n);
      double fourth = 0;
      for (int i = 0; i < points.size(); i++) {
        double square = squaredLength(points, i);
        fourth += points.weight(i) * square * square;
      }
      assertRelative("n = " + n, n * (n + 2), fourth, 1e-14);
    }
  }

  private static double squaredLength(UnitPoints points, int index) {
    double square = 0;
    for (double x : UnitMoments.place(points, index)) {
      square += x * x;
    }
    return square;
  }
}

package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;

/** Random draws: reproducible, normal, and standardised when asked for. */
class RandomRuleTest {
  @Test
  void theSameSeedGivesTheSameBits() {
    UnitPoints one = RandomRule.independent(100, 5).points(3);
    UnitPoints two = RandomRule.independent(100, 5).points(3);
    UnitPoints other = RandomRule.independent(100, 6).points(3);
    for (int i = 0; i < 100; i++) {
      for (int axis = 0; axis < 3; axis++) {
        assertEquals(one.coordinate(i, axis), two.coordinate(i, axis));
        assertNotEquals(one.coordinate(i, axis), other.coordinate(i, axis));
      }
    }
  }

  @Test
  void aGivenGeneratorIsUsedAfreshEachTime() {
    RandomRule rule = RandomRule.independent(10, () -> new Random(3));
    assertEquals(rule.points(2).coordinate(7, 1), rule.points(2).coordinate(7, 1));
    assertNotEquals(
        rule.points(2).coordinate(7, 1),
        RandomRule.independent(10, () -> new Random(4)).points(2).coordinate(7, 1));
  }

  /**
   * Moments of 100 000 draws within 5 standard errors of those of N(0, 1): mean 1, variance 2, third
   * moment 15, fourth 96 divided by N. One fixed seed; 4 checks, false alarm 2e-6 in a new seed.
   */
  @Test
  void drawsAreNormal() {
    UnitPoints points = RandomRule.independent(100_000, 11).points(1);
    double[] exact = {0, 1, 0, 3};
    double[] variance = {1, 2, 15, 96};
    for (int power = 1; power <= 4; power++) {
      double sum = 0;
      for (int i = 0; i < points.size(); i++) {
        sum += points.weight(i) * Math.pow(points.coordinate(i, 0), power);
      }
      double error = Math.sqrt(variance[power - 1] / points.size());
      assertWithin("moment " + power, exact[power - 1], sum, 5, error);
    }
  }

  /** 1e-14: rounding of sums of 500 numbers of order 1 / 500. */
  @Test
  void standardisedDrawsHaveMeanZeroAndCovarianceI() {
    for (int n = 1; n <= 6; n++) {
      UnitPoints points = RandomRule.independent(500, 17).standardised().points(n);
      assertFalse(points.isSample());
      for (int a = 0; a < n; a++) {
        for (int b = 0; b < n; b++) {
          double product = 0;
          double mean = 0;
          for (int i = 0; i < points.size(); i++) {
            product += points.weight(i) * points.coordinate(i, a) * points.coordinate(i, b);
            mean += points.weight(i) * points.coordinate(i, a);
          }
          assertWithin("mean", 0, mean, 1e-14, 1);
          assertWithin("covariance", a == b ? 1 : 0, product, 1e-14, 1);
        }
      }
    }
  }

  /** The first of each pair is what independent draws of the seed are. */
  @Test
  void antitheticDrawsComeInPairs() {
    UnitPoints points = RandomRule.antithetic(20, 5).points(3);
    UnitPoints draws = RandomRule.independent(20, 5).points(3);
    assertEquals(40, points.size());
    for (int i = 0; i < 20; i++) {
      for (int axis = 0; axis < 3; axis++) {
        assertEquals(draws.coordinate(i, axis), points.coordinate(2 * i, axis));
        assertEquals(-draws.coordinate(i, axis), points.coordinate(2 * i + 1, axis));
      }
    }
  }

  @Test
  void badCountsAreRefused() {
    assertRefused(() -> RandomRule.antithetic(15, 0), "16 pairs or more, got 15");
    assertRefused(() -> RandomRule.antithetic(50_001, 0), "100002", "100000");
    assertRefused(() -> RandomRule.antithetic(Integer.MAX_VALUE, 0), "4294967294", "100000");
    assertTrue(RandomRule.antithetic(50_000, 0).points(1).size() == 100_000);
    assertRefused(() -> RandomRule.independent(1, 0), "2 draws or more, got 1");
    assertRefused(() -> RandomRule.independent(100_001, 0), "100001", "100000");
    RandomRule few = RandomRule.independent(3, 0).standardised();
    assertTrue(few.points(2).size() == 3);
    assertRefused(() -> few.points(3), "3 draws in 3 dimensions");
    assertRefused(
        () -> RandomRule.independent(9, () -> new Constant()).standardised().points(2), "pivot");
  }

  private static void assertRefused(
      org.junit.jupiter.api.function.Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  /** Draws that never change. */
  private static final class Constant extends Random {
    private static final long serialVersionUID = 1;

    @Override
    public double nextDouble() {
      return 0.75;
    }
  }
}

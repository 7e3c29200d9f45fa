package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Sobol and Halton points: the published sequences, plain and shifted. */
class QuasiRandomRuleTest {
  private static final NormalDistribution NORMAL = new NormalDistribution(null, 0, 1);

  /** The point in the unit cube that a point came from. */
  private static double[] cube(UnitPoints points, int i) {
    double[] place = UnitMoments.place(points, i);
    for (int axis = 0; axis < place.length; axis++) {
      place[axis] = NORMAL.cumulativeProbability(place[axis]);
    }
    return place;
  }

  static Stream<ReferenceTable.Row> firstPoints() {
    return ReferenceTable.read("quasi_random_points.csv").stream();
  }

  /** 1e-14: there and back through the normal distribution function near the centre. */
  @ParameterizedTest
  @MethodSource("firstPoints")
  void pointsAreThoseOfTheSequence(ReferenceTable.Row row) {
    boolean sobol = row.text("sequence").equals("Sobol");
    QuasiRandomRule rule = sobol ? QuasiRandomRule.sobol(9) : QuasiRandomRule.halton(9);
    double[] wanted = row.numbers("point");
    double[] got = cube(rule.points(wanted.length), row.count("index") - 1);
    assertVector(row.toString(), wanted, got, 1e-14, 1);
  }

  /** Each replicate is the sequence, moved by one vector modulo 1; 1e-13: there and back. */
  @Test
  void aShiftMovesAllPointsAlike() {
    UnitPoints plain = QuasiRandomRule.halton(20).points(3);
    UnitPoints shifted = QuasiRandomRule.halton(20).shifted(16, 9).points(3);
    assertEquals(320, shifted.size());
    for (int i = 0; i < 320; i++) {
      double[] moved = cube(shifted, i);
      double[] first = cube(shifted, i - i % 20);
      double[] x = cube(plain, i % 20);
      double[] start = cube(plain, 0);
      for (int axis = 0; axis < 3; axis++) {
        double apart = moved[axis] - first[axis] - (x[axis] - start[axis]);
        assertWithin("point " + i, Math.rint(apart), apart, 1e-13, 1);
      }
    }
  }

  /** 1000 shifts in 2 dimensions are uniform: mean 1/2, of deviation sqrt(1/12/1000); 5 of them. */
  @Test
  void shiftsAreUniformAndDiffer() {
    UnitPoints shifted = QuasiRandomRule.sobol(2).shifted(1000, 10).points(2);
    double[] sum = new double[2];
    double product = 0;
    for (int r = 0; r < 1000; r++) {
      double[] x = cube(shifted, 2 * r);
      sum[0] += x[0] / 1000;
      sum[1] += x[1] / 1000;
      product += (x[0] - 0.5) * (x[1] - 0.5) / 1000;
    }
    assertWithin("x", 0.5, sum[0], 5, Math.sqrt(1 / 12.0 / 1000));
    assertWithin("y", 0.5, sum[1], 5, Math.sqrt(1 / 12.0 / 1000));
    assertWithin("xy", 0, product, 5, 1 / 12.0 / Math.sqrt(1000));
  }

  @Test
  void theSameSeedGivesTheSameBits() {
    QuasiRandomRule sobol = QuasiRandomRule.sobol(10);
    assertEquals(UnitMoments.bits(sobol.points(3)), UnitMoments.bits(sobol.points(3)));
    assertEquals(
        UnitMoments.bits(sobol.shifted(16, 1).points(3)),
        UnitMoments.bits(QuasiRandomRule.sobol(10).shifted(16, 1).points(3)));
    assertNotEquals(
        UnitMoments.bits(sobol.shifted(16, 1).points(3)),
        UnitMoments.bits(sobol.shifted(16, 2).points(3)));
  }

  @Test
  void dimensionsEndWithTheGenerators() {
    assertEquals(1000, QuasiRandomRule.sobol(2).points(1000).dimension());
    assertEquals(40, QuasiRandomRule.halton(2).points(40).dimension());
    assertRefused(() -> QuasiRandomRule.sobol(2).points(1001), "Sobol", "1000", "got 1001");
    assertRefused(() -> QuasiRandomRule.halton(2).points(41), "Halton", "40", "got 41");
  }

  @Test
  void badCountsAreRefused() {
    assertRefused(() -> QuasiRandomRule.sobol(1), "Sobol", "2 points", "got 1");
    assertRefused(() -> QuasiRandomRule.halton(0), "Halton", "2 points", "got 0");
    assertRefused(() -> QuasiRandomRule.sobol(100_001), "100001", "100000");
    QuasiRandomRule rule = QuasiRandomRule.halton(6251);
    assertRefused(() -> rule.shifted(16, 0), "100016", "100000");
    assertRefused(() -> rule.shifted(0, 0), "1 or more, got 0");
    assertRefused(() -> rule.shifted(15, 0), "16 and more, got 15");
    assertRefused(() -> QuasiRandomRule.sobol(3).standardised().points(3), "3 draws in 3");
    assertTrue(QuasiRandomRule.sobol(100_000).points(1).size() == 100_000);
  }

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }
}

package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Degrees, counts and weights of sparse grids. */
class SparseGridRuleTest {
  /** By the argument in the javadoc of the rule: smallest sums of 2, 6, 16, 30 that need more. */
  @ParameterizedTest
  @CsvSource({
    "1, 5, 3, 3, 3, 3, 3",
    "2, 15, 7, 5, 5, 5, 5",
    "3, 29, 11, 9, 7, 7, 7",
    "4, 51, 21, 13, 11, 9, 9"
  })
  void levelsHaveTheDegreesOfTheTable(
      int level, int one, int two, int three, int four, int five, int six) {
    int[] degrees = {one, two, three, four, five, six};
    for (int n = 1; n <= degrees.length; n++) {
      UnitPoints points = SparseGridRule.ofLevel(level).points(n);
      assertEquals(degrees[n - 1], points.degree(), "n = " + n);
      assertExactToTheDegreeOnly(points);
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 3, 4, 5, 6, 7, 8, 9, 11, 13, 15, 21, 31, 51})
  void theDegreeAskedForIsReached(int degree) {
    int largest = degree < 10 ? 6 : degree < 20 ? 4 : 2;
    for (int n = 1; n <= largest; n++) {
      UnitPoints points = SparseGridRule.ofDegree(degree).points(n);
      assertTrue(points.degree() >= degree, "n = " + n);
      assertTrue(n < degree || points.degree() <= degree + 1, "no more than asked for");
      assertExactToTheDegreeOnly(points);
    }
  }

  @Test
  void degreesHoldInManyDimensions() {
    for (int n : new int[] {7, 9, 12}) {
      for (int level = 1; level <= 3; level++) {
        UnitPoints points = SparseGridRule.ofLevel(level).points(n);
        assertEquals(2 * level + 1, points.degree());
        assertExactToTheDegreeOnly(points);
        assertExactToTheDegreeOnly(SparseGridRule.ofDegree(2 * level + 1).points(n));
      }
    }
  }

  /**
   * Points and weights do not change when axes are exchanged or one is mirrored (tested apart), so it
   * is enough to try even powers in falling order; others are 0 by symmetry or equal.
   */
  private static void assertExactToTheDegreeOnly(UnitPoints points) {
    boolean fails = false;
    for (int degree = 0; degree <= points.degree() + 1; degree += 2) {
      for (int[] powers : evenPowers(points.dimension(), degree)) {
        double wanted = UnitMoments.exact(powers);
        double value =
            UnitMoments.of(points, powers) + (degree == 0 ? points.centreMeanWeight() : 0);
        boolean exact = Math.abs(value - wanted) <= tolerance(points, powers);
        assertTrue(exact || degree > points.degree(), () -> Arrays.toString(powers) + " " + value);
        fails |= !exact;
      }
    }
    assertTrue(fails, "a monomial of degree " + (points.degree() + 1) + " must be wrong");
  }

  /** 64 roundings of the sum of the sizes of terms, or of the amplification for small ones. */
  private static double tolerance(UnitPoints points, int[] powers) {
    double size = points.weightAmplification();
    for (int i = 0; i < points.size(); i++) {
      double term = Math.abs(points.weight(i));
      for (int axis = 0; axis < powers.length && powers[axis] > 0; axis++) {
        term *= Math.pow(points.coordinate(i, axis), powers[axis]);
      }
      size += term;
    }
    return 64 * 0x1p-53 * size;
  }

  private static List<int[]> evenPowers(int n, int degree) {
    List<int[]> all = new ArrayList<>();
    extend(new int[n], 0, degree, degree, all);
    return all;
  }

  private static void extend(int[] powers, int axis, int rest, int most, List<int[]> all) {
    if (axis == powers.length || rest == 0) {
      if (rest == 0) {
        all.add(powers.clone());
      }
      return;
    }
    for (int power = Math.min(rest, most); power >= 2; power -= 2) {
      powers[axis] = power;
      extend(powers, axis + 1, rest - power, power, all);
      powers[axis] = 0;
    }
  }

  /** Closed counts of the javadoc, the centre included. */
  @Test
  void countsAreTheClosedOnes() {
    for (int n = 1; n <= 12; n++) {
      int pairs = n * (n - 1) / 2;
      int triples = n * (n - 1) * (n - 2) / 6;
      assertEquals(1 + 2 * n, 1 + SparseGridRule.ofLevel(1).points(n).size());
      assertEquals(1 + 2 * n, 1 + SparseGridRule.ofDegree(3).points(n).size());
      int second = 1 + 8 * n + 4 * pairs;
      assertEquals(second, 1 + SparseGridRule.ofLevel(2).points(n).size());
      int zero = n == 4 ? 8 : 0;
      assertEquals(
          1 + 2 * n * n - zero, 1 + SparseGridRule.ofDegree(5).points(n).size());
      zero = n == 5 ? 4 * pairs : 0;
      int seventh = 1 + 8 * n + 4 * pairs + 8 * triples;
      assertEquals(seventh - zero, 1 + SparseGridRule.ofDegree(7).points(n).size());
      int third = 1 + 18 * n + (2 * 2 + 2 * 2 * 6) * pairs + 8 * triples;
      assertEquals(third, 1 + SparseGridRule.ofLevel(3).points(n).size());
    }
  }

  /** On one axis level q is the nested rule, to rounding of sums of differences. */
  @Test
  void oneAxisHasTheNestedNodes() {
    NestedNodes nodes = NestedNodes.standardNormal();
    for (int level = 1; level <= 4; level++) {
      UnitPoints points = SparseGridRule.ofLevel(level).points(1);
      assertEquals(nodes.count(level) - 1, points.size());
      double eps = 8 * 0x1p-53;
      assertWithin("centre", nodes.weight(level, 0), points.centreMeanWeight(), eps, 1);
      for (int i = 0; i < points.size(); i++) {
        assertEquals(nodes.node(i + 1), points.coordinate(i, 0));
        assertWithin("weight " + i, nodes.weight(level, i + 1), points.weight(i), eps, 1);
      }
    }
  }

  /** By hand: degree 5 has 1/36 on diagonals, (4 - n) / 18 on axes, (n^2 - 7 n + 18) / 18 amid. */
  @Test
  void degreeFiveHasItsRationalWeights() {
    for (int n = 1; n <= 12; n++) {
      UnitPoints points = SparseGridRule.ofDegree(5).points(n);
      double size = 0x1p-53 * 8 * n * n;
      double centre = (n * n - 7 * n + 18) / 18.0;
      assertWithin("centre, n = " + n, centre, points.centreMeanWeight(), size, 1);
      for (int i = 0; i < points.size(); i++) {
        boolean onAxis = points.start(i + 1) - points.start(i) == 1;
        double wanted = onAxis ? (4 - n) / 18.0 : 1 / 36.0;
        assertWithin("n = " + n, wanted, points.weight(i), 16 * 0x1p-53, 1);
        assertEquals(Math.sqrt(3), Math.abs(points.coordinate(points.start(i))));
      }
    }
  }

  /** Every axis alone may be mirrored, not only all at once. */
  @Test
  void mirroringOneAxisGivesTheSamePoints() {
    UnitPoints points = SparseGridRule.ofLevel(3).points(3);
    Map<List<Double>, Double> weights = new HashMap<>();
    for (int i = 0; i < points.size(); i++) {
      weights.put(UnitMoments.key(UnitMoments.place(points, i)), points.weight(i));
    }
    for (int i = 0; i < points.size(); i++) {
      double[] place = UnitMoments.place(points, i);
      place[i % 3] = -place[i % 3];
      assertEquals(points.weight(i), weights.get(UnitMoments.key(place)));
    }
  }

  @Test
  void noAxisLeavesTheCentre() {
    UnitPoints points = SparseGridRule.ofLevel(2).points(0);
    assertEquals(0, points.size());
    assertEquals(1, points.centreMeanWeight());
  }

  /** By hand for degree 5 above n = 4: (n^2 - 7 n + 18 + 2 n (n - 4) + n (n - 1)) / 18. */
  @Test
  void someWeightsAreNegative() {
    UnitPoints points = SparseGridRule.ofDegree(5).points(12);
    assertTrue(points.weight(0) < 0);
    double wanted = (144 - 84 + 18 + 2 * 12 * 8 + 12 * 11) / 18.0;
    assertWithin("amplification", wanted, points.weightAmplification(), 1e-13, wanted);
    assertFalse(SparseGridRule.ofDegree(5).points(3).weightAmplification() > 1 + 1e-15);
  }

  @ParameterizedTest
  @ValueSource(ints = {-1, 0, 5, 100})
  void levelsAreFromOneToFour(int level) {
    assertNames(
        refusal(() -> SparseGridRule.ofLevel(level)), "level", "1 to 4", Integer.toString(level));
  }

  @ParameterizedTest
  @ValueSource(ints = {-3, 0, 1, 52, 99})
  void degreesAreFromTwoToFiftyOne(int degree) {
    assertNames(
        refusal(() -> SparseGridRule.ofDegree(degree)),
        "degree",
        "2 to 51",
        Integer.toString(degree));
  }

  /** Counts by the closed forms; the last one by its leading term, (2 n)^25 / 25!. */
  @Test
  void tooManyPointsAreRefusedWithTheirCount() {
    assertNames(
        refusal(() -> SparseGridRule.ofLevel(2).points(223)), "100797", "100000", "level 2", "223");
    assertNames(refusal(() -> SparseGridRule.ofDegree(5).points(224)), "100353", "degree 5");
    assertNames(refusal(() -> SparseGridRule.ofDegree(51).points(40_000)), "E97", "40000 axes");
  }

  private static String refusal(Executable call) {
    return assertThrows(IllegalArgumentException.class, call).getMessage();
  }
}

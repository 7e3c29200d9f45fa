package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.ReferenceTable;
import java.util.BitSet;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** One point to a stratum on every axis, anywhere in it, in an order of its own. */
class LatinHypercubeRuleTest {
  private static final NormalDistribution NORMAL = new NormalDistribution(null, 0, 1);

  private static double stratum(UnitPoints points, int i, int axis, int strata) {
    return strata * NORMAL.cumulativeProbability(points.coordinate(i, axis));
  }

  @Test
  void everyStratumOfEveryAxisHoldsOnePoint() {
    int strata = 50;
    UnitPoints points = LatinHypercubeRule.of(strata, 3).replicates(16).points(4);
    assertEquals(800, points.size());
    for (int first = 0; first < 800; first += strata) {
      for (int axis = 0; axis < 4; axis++) {
        BitSet seen = new BitSet();
        for (int i = first; i < first + strata; i++) {
          seen.set((int) stratum(points, i, axis, strata));
        }
        assertEquals(strata, seen.cardinality());
        assertEquals(strata, seen.length());
      }
    }
  }

  /** Uniform in the stratum: mean 1/2, variance 1/12, over 8000 places; 5 deviations, one seed. */
  @Test
  void thePlaceInAStratumIsRandom() {
    UnitPoints points = LatinHypercubeRule.of(4000, 8).points(2);
    double sum = 0;
    double squares = 0;
    for (int i = 0; i < 4000; i++) {
      for (int axis = 0; axis < 2; axis++) {
        double place = stratum(points, i, axis, 4000) % 1 - 0.5;
        sum += place / 8000;
        squares += place * place / 8000;
      }
    }
    assertWithin("mean", 0, sum, 5, Math.sqrt(1 / 12.0 / 8000));
    // The variance of a square is 1/80 - 1/144.
    assertWithin("variance", 1 / 12.0, squares, 5, Math.sqrt((1 / 80.0 - 1 / 144.0) / 8000));
  }

  /** Two random orders of N have a rank correlation of deviation 1 / sqrt(N - 1); 5 of them. */
  @Test
  void axesAndReplicatesAreOrderedAnew() {
    UnitPoints points = LatinHypercubeRule.of(1000, 4).replicates(16).points(2);
    assertWithin("axes", 0, correlation(points, 0, 0, 0, 1), 5, 1 / Math.sqrt(999));
    assertWithin("replicates", 0, correlation(points, 0, 0, 1000, 0), 5, 1 / Math.sqrt(999));
    assertWithin("both", 0, correlation(points, 0, 0, 1000, 1), 5, 1 / Math.sqrt(999));
  }

  private static double correlation(UnitPoints points, int i, int axis, int j, int other) {
    double sum = 0;
    for (int k = 0; k < 1000; k++) {
      double one = Math.floor(stratum(points, i + k, axis, 1000)) - 499.5;
      double two = Math.floor(stratum(points, j + k, other, 1000)) - 499.5;
      sum += one * two;
    }
    return sum / 1000 / (999_999 / 12.0);
  }

  static java.util.stream.Stream<ReferenceTable.Row> rows() {
    return ReferenceTable.read("latin_hypercube.csv").stream();
  }

  /** 1e-14: the inverse normal map's 4e-15 and what rounding of 2 p - 1 does at p above 0.05. */
  @ParameterizedTest
  @MethodSource("rows")
  void aSeedGivesThePointsOfTheDefinition(ReferenceTable.Row row) {
    UnitPoints points = LatinHypercubeRule.of(5, row.count("seed")).points(2);
    int i = row.count("point");
    assertWithin("x", row.number("x"), points.coordinate(i, 0), 1e-14, 1);
    assertWithin("y", row.number("y"), points.coordinate(i, 1), 1e-14, 1);
  }

  @Test
  void theSameSeedGivesTheSameBits() {
    LatinHypercubeRule rule = LatinHypercubeRule.of(10, 7).replicates(16);
    assertEquals(UnitMoments.bits(rule.points(3)), UnitMoments.bits(rule.points(3)));
    assertNotEquals(
        UnitMoments.bits(LatinHypercubeRule.of(10, 7).points(3)),
        UnitMoments.bits(LatinHypercubeRule.of(10, 8).points(3)));
  }

  @Test
  void badCountsAreRefused() {
    assertRefused(() -> LatinHypercubeRule.of(1, 0), "2 points", "got 1");
    assertRefused(() -> LatinHypercubeRule.of(100_001, 0), "100001", "100000");
    LatinHypercubeRule rule = LatinHypercubeRule.of(6251, 0);
    assertRefused(() -> rule.replicates(16), "100016", "100000");
    assertRefused(() -> rule.replicates(0), "16 and more, got 0");
    assertRefused(() -> rule.replicates(15), "16 and more, got 15");
    assertRefused(() -> rule.replicates(Integer.MAX_VALUE), "13423920", "100000");
    assertRefused(() -> LatinHypercubeRule.of(3, 0).standardised().points(3), "3 draws in 3");
    assertTrue(LatinHypercubeRule.of(6250, 0).replicates(16).points(1).size() == 100_000);
  }

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }
}

package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The shipped nodes against their defining conditions, in exact and in 150-digit arithmetic. */
class NestedNodesTest {
  private static final NestedNodes NODES = NestedNodes.standardNormal();

  /** Nodes that each level adds, and degrees reached: Genz and Keister 1996, from memory. */
  private static final int[] ADDED = {0, 2, 6, 10, 16};

  private static final int[] DEGREES = {1, 5, 15, 29, 51};

  /** Computed anew, every shipped number is the nearest double of one with 100 digits or more. */
  @Test
  void theTableIsWhatTheExtensionGives() {
    NormalExtension extension = new NormalExtension();
    for (int level = 0; level < NODES.levels(); level++) {
      extension.extend(ADDED[level]);
      List<BigDecimal> nodes = extension.nodes();
      List<BigDecimal> weights = extension.weights();
      assertEquals(2 * nodes.size() - 1, NODES.count(level));
      for (int index = 0; index < NODES.count(level); index++) {
        double node = nodes.get((index + 1) / 2).doubleValue();
        double signed = index % 2 == 0 ? 0 - node : node;
        assertEquals(signed, NODES.node(index), "node " + index);
        double weight = weights.get((index + 1) / 2).doubleValue();
        assertEquals(weight, NODES.weight(level, index), "weight " + index + ", level " + level);
      }
    }
  }

  /**
   * Sums of the shipped doubles, taken exactly. A node is off by 2^-53 of itself at most, its power k by
   * k times that, a weight by 2^-53: hence the bound of the error, 1 % larger for products of errors. Odd
   * moments are 0 exactly. The next even moment misses by far more than the bound.
   */
  @ParameterizedTest
  @ValueSource(ints = {0, 1, 2, 3, 4})
  void momentsAreExactToTheDegreeAndNoFurther(int level) {
    assertEquals(DEGREES[level], NODES.degree(level));
    for (int power = 0; power <= DEGREES[level] + 1; power++) {
      BigDecimal sum = BigDecimal.ZERO;
      BigDecimal size = BigDecimal.ZERO;
      for (int index = 0; index < NODES.count(level); index++) {
        BigDecimal term =
            new BigDecimal(NODES.node(index)).pow(power).multiply(weight(level, index));
        sum = sum.add(term);
        size = size.add(term.abs());
      }
      BigDecimal error = sum.subtract(NormalExtension.moment(power)).abs();
      BigDecimal bound = size.multiply(BigDecimal.valueOf(1.01 * (power + 1) * 0x1p-53));
      boolean exact = error.compareTo(power % 2 == 1 ? BigDecimal.ZERO : bound) <= 0;
      assertEquals(power <= DEGREES[level], exact, "level " + level + ", power " + power);
    }
  }

  private static BigDecimal weight(int level, int index) {
    return new BigDecimal(NODES.weight(level, index));
  }

  /** Genz and Keister 1996, from memory: extents to three digits, and one pair of negative weights. */
  @Test
  void extentsAndSignsAreThePublishedOnes() {
    double[] extents = {0, 1.732, 4.185, 6.363, 9.017};
    for (int level = 0; level < NODES.levels(); level++) {
      double largest = 0;
      for (int index = 0; index < NODES.count(level); index++) {
        largest = Math.max(largest, NODES.node(index));
        boolean negative = level == 3 && Math.abs(Math.abs(NODES.node(index)) - 2.861) < 5e-4;
        assertEquals(negative, NODES.weight(level, index) < 0, level + ", " + index);
      }
      assertWithin("level " + level, extents[level], largest, 5e-4, 1);
    }
  }

  @Test
  void nodesAreDistinctAndInPairs() {
    for (int index = 1; index < 35; index += 2) {
      assertTrue(NODES.node(index) > 0);
      assertEquals(-NODES.node(index), NODES.node(index + 1));
    }
    assertEquals(35, IntStream.range(0, 35).mapToObj(NODES::node).distinct().count());
    assertEquals(0.0, NODES.node(0));
  }

  @Test
  void levelsBeginWhereTheLastEnds() {
    for (int level = 0; level < NODES.levels(); level++) {
      int first = level == 0 ? 0 : NODES.count(level - 1);
      assertEquals(level, NODES.firstLevel(first));
      assertEquals(level, NODES.firstLevel(NODES.count(level) - 1));
    }
  }

  /** By definition, each rounded twice; and their sum, which is 0 for l above 0, to rounding. */
  @Test
  void differencesAreBetweenLevels() {
    for (int level = 0; level < NODES.levels(); level++) {
      double sum = 0;
      for (int index = 0; index < NODES.count(level); index++) {
        boolean old = level > 0 && index < NODES.count(level - 1);
        double before = old ? NODES.weight(level - 1, index) : 0;
        double wanted = NODES.weight(level, index) - before;
        assertWithin("difference", wanted, NODES.difference(level, index), 4 * 0x1p-53, 1);
        sum += NODES.difference(level, index);
      }
      assertWithin("sum of level " + level, level == 0 ? 1 : 0, sum, 4 * 0x1p-53, 1);
    }
    assertEquals(-1 / 3.0, NODES.difference(1, 0));
  }

  /** Closed forms: E cos(a x) = exp(-a^2 / 2), E exp(a x) = exp(a^2 / 2); rounding is below 1e-14. */
  @Test
  void thirtyFiveNodesIntegrateCosinesAndExponentials() {
    for (double a : new double[] {0.5, 1, 2}) {
      assertWithin("cos", Math.exp(-a * a / 2), mean(4, x -> Math.cos(a * x)), 1e-13, 1);
      double wanted = Math.exp(a * a / 2);
      assertWithin("exp", wanted, mean(4, x -> Math.exp(a * x)), 1e-13, wanted);
    }
  }

  private static double mean(int level, DoubleUnaryOperator function) {
    double sum = 0;
    for (int index = NODES.count(level) - 1; index >= 0; index--) {
      sum += NODES.weight(level, index) * function.applyAsDouble(NODES.node(index));
    }
    return sum;
  }

  @Test
  void whatThereIsNotIsRefused() {
    for (int level : new int[] {-1, 5}) {
      String got = Integer.toString(level);
      assertNames(refusal(() -> NODES.count(level)), "level", "0 to 4", got);
      assertNames(refusal(() -> NODES.degree(level)), "level", "0 to 4", got);
      assertNames(refusal(() -> NODES.weight(level, 0)), "level", "0 to 4", got);
    }
    assertNames(refusal(() -> NODES.node(35)), "node", "0 to 34", "35");
    assertNames(refusal(() -> NODES.firstLevel(-1)), "node", "0 to 34", "-1");
    assertNames(refusal(() -> NODES.weight(1, 3)), "node", "0 to 2", "3");
    assertNames(refusal(() -> NODES.difference(2, 9)), "node", "0 to 8", "9");
  }

  private static String refusal(Executable call) {
    return assertThrows(IllegalArgumentException.class, call).getMessage();
  }
}

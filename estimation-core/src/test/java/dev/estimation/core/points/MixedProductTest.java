package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;

/** Gauss-Hermite products whose axes differ. */
class MixedProductTest {
  /** By definition: every product of a node and weight of one axis with those of the other. */
  @Test
  void pointsAreTheProductsOfThoseOfTheAxes() {
    UnitPoints three = GaussHermiteRule.product(3).points(1);
    UnitPoints five = GaussHermiteRule.product(5).points(1);
    UnitPoints mixed = GaussHermiteRule.product(3, 5).points(2);
    assertEquals(14, mixed.size());
    assertEquals(three.centreMeanWeight() * five.centreMeanWeight(), mixed.centreMeanWeight());
    int onBoth = 0;
    for (int i = 0; i < mixed.size(); i++) {
      double wanted =
          weightAt(three, mixed.coordinate(i, 0)) * weightAt(five, mixed.coordinate(i, 1));
      assertEquals(wanted, mixed.weight(i), 0x1p-52 * wanted, "one rounding of a product");
      onBoth += mixed.coordinate(i, 0) != 0 && mixed.coordinate(i, 1) != 0 ? 1 : 0;
    }
    assertEquals(8, onBoth);
  }

  private static double weightAt(UnitPoints axis, double node) {
    for (int i = 0; i < axis.size(); i++) {
      if (axis.coordinate(i, 0) == node) {
        return axis.weight(i);
      }
    }
    assertEquals(0, node);
    return axis.centreMeanWeight();
  }

  @Test
  void anEvenNumberOfNodesLeavesTheCentreWithoutWeight() {
    UnitPoints mixed = GaussHermiteRule.product(3, 4, 5).points(3);
    assertEquals(60, mixed.size());
    assertEquals(0, mixed.centreMeanWeight());
    assertEquals(5, mixed.degree());
  }

  /** Powers to 9 along the axis of five nodes are right, the sixth of the other is 9, not 15. */
  @Test
  void everyAxisHasTheDegreeOfItsOwnNodes() {
    UnitPoints mixed = GaussHermiteRule.product(3, 5).points(2);
    assertEquals(5, mixed.degree());
    assertEquals(3 * 105, UnitMoments.of(mixed, new int[] {4, 8}), 1e-11); // some eps of 315
    assertEquals(9, UnitMoments.of(mixed, new int[] {6, 0}), 1e-12);
  }

  @Test
  void sameNumbersAreTheSameBitsAsOneForAll() {
    assertEquals(
        UnitMoments.bits(GaussHermiteRule.product(4).points(3)),
        UnitMoments.bits(GaussHermiteRule.product(4, 4, 4).points(3)));
  }

  @Test
  void theCountMustMatchTheDimension() {
    GaussHermiteRule rule = GaussHermiteRule.product(3, 5);
    String message =
        assertThrows(IllegalArgumentException.class, () -> rule.points(3)).getMessage();
    assertNames(message, "each of 3 axes", "got 2", "[3, 5]");
  }

  @Test
  void everyNumberIsChecked() {
    String message = assertThrows(
            IllegalArgumentException.class, () -> GaussHermiteRule.product(3, 1))
        .getMessage();
    assertNames(message, "from 2 to 100", "got 1");
  }

  @Test
  void theArrayIsCopied() {
    int[] nodes = {3, 5};
    GaussHermiteRule rule = GaussHermiteRule.product(nodes);
    nodes[0] = 9;
    assertEquals(14, rule.points(2).size());
  }
}

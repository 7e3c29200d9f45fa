package dev.estimation.core.space;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** How flat spaces are put together, and where their angles end. */
class FlatSpaceTest {
  private final FlatSpace rangeBearing = Space.reals(1).and(Space.angles(1));

  @Test
  void partsAreJoinedInOrder() {
    assertEquals(2, rangeBearing.storage());
    assertEquals(2, rangeBearing.dimension());
    assertFalse(rangeBearing.isAngle(0));
    assertTrue(rangeBearing.isAngle(1));
    assertEquals(Space.reals(2).and(Space.reals(1)), Space.reals(3));
    assertEquals(Space.reals(3).hashCode(), Space.reals(2).and(Space.reals(1)).hashCode());
    assertNotEquals(rangeBearing, Space.angles(1).and(Space.reals(1)));
    assertNotEquals(Space.reals(2), Space.reals(3));
    assertNames(rangeBearing.toString(), "real", "angle");
  }

  @ParameterizedTest
  @ValueSource(ints = {0, -3})
  void aSpaceHasAComponent(int count) {
    String text = Integer.toString(count);
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> Space.reals(count)).getMessage(),
        "at least 1",
        text);
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> Space.angles(count)).getMessage(),
        "at least 1",
        text);
  }

  /** Reals are subtracted and added as they are; only the angle is wrapped. */
  @Test
  void onlyAnglesAreWrapped() {
    double[] apart = new double[2];
    rangeBearing.difference(new double[] {10, 3}, new double[] {1, -3}, apart);
    assertEquals(9, apart[0]);
    // 6 - 2 pi: one rounding of 2 pi.
    assertEquals(6 - 2 * Math.PI, apart[1], 1e-15);
    double[] moved = new double[2];
    rangeBearing.displace(new double[] {10, 3}, new double[] {1, 1}, moved);
    assertEquals(11, moved[0]);
    assertEquals(4 - 2 * Math.PI, moved[1], 1e-15);
  }

  @Test
  void pointsNeedNotBeWrappedButResultsAre() {
    FlatSpace angles = Space.angles(1);
    double[] raw = {Math.PI, -Math.PI, 3 * Math.PI, 1e6, 1e16, Math.nextDown(Math.PI)};
    for (double a : raw) {
      for (double b : raw) {
        double[] result = new double[1];
        angles.difference(new double[] {a}, new double[] {b}, result);
        assertInRange(result[0], a, b);
        angles.displace(new double[] {a}, new double[] {b}, result);
        assertInRange(result[0], a, b);
      }
    }
  }

  private static void assertInRange(double angle, double a, double b) {
    assertTrue(angle >= -Math.PI && angle < Math.PI, () -> angle + " from " + a + " and " + b);
  }

  @Test
  void infinityPassesThroughReals() {
    double[] apart = new double[2];
    double infinite = Double.POSITIVE_INFINITY;
    rangeBearing.difference(new double[] {infinite, infinite}, new double[2], apart);
    assertEquals(infinite, apart[0]);
    assertTrue(Double.isNaN(apart[1]), "an infinite angle has no direction");
  }
}

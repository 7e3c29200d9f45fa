package dev.estimation.core.space;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Wrapping of angles: range, congruence and the doubles at the seam. */
class AngleTest {
  private static void assertInRange(double angle) {
    double wrapped = Angle.wrap(angle);
    assertTrue(
        wrapped >= -Math.PI && wrapped < Math.PI, () -> angle + " was wrapped to " + wrapped);
  }

  @Test
  void angleInRangeIsReturnedBitForBit() {
    double[] inside = {
      0.0, -0.0, 1e-300, -Math.PI, Math.nextDown(Math.PI), Math.nextUp(-Math.PI), 3, -3,
    };
    for (double angle : inside) {
      long bits = Double.doubleToRawLongBits(angle);
      assertEquals(bits, Double.doubleToRawLongBits(Angle.wrap(angle)), "wrap(" + angle + ")");
    }
  }

  @Test
  void theSeamBelongsToMinusPi() {
    assertEquals(-Math.PI, Angle.wrap(Math.PI));
    assertEquals(-Math.PI, Angle.wrap(-Math.PI));
  }

  @ParameterizedTest
  @ValueSource(
      doubles = {
        Math.PI,
        3 * Math.PI,
        -3 * Math.PI,
        5 * Math.PI,
        2 * Math.PI,
        100,
        1e6,
        -1e6,
        1e9,
        1e15,
        1e16,
        -1e16
      })
  void adversarialAnglesAreInRange(double angle) {
    for (double near : new double[] {angle, Math.nextUp(angle), Math.nextDown(angle)}) {
      assertInRange(near);
      assertInRange(-near);
    }
  }

  /** Angles of so many turns carry no meaning, but must not leave the range either. */
  @ParameterizedTest
  @ValueSource(doubles = {3e16, 1e17, 1e18, 1e22, 1e100, 1e300, Double.MAX_VALUE})
  void anglesBeyondThePrecisionOfADoubleAreInRange(double angle) {
    assertInRange(angle);
    assertInRange(-angle);
  }

  /** Multiples of pi and their neighbours, where a quotient may be rounded across an integer. */
  @Test
  void multiplesOfPiAreInRange() {
    for (int k = -100_000; k <= 100_000; k++) {
      double angle = k * Math.PI;
      assertInRange(angle);
      assertInRange(Math.nextUp(angle));
      assertInRange(Math.nextDown(angle));
    }
  }

  /**
   * Sine and cosine do not change. 2 pi as a double is off by 2.5e-16 a turn, the product with the
   * number of turns is rounded by 7e-16 a turn at most; and 2 eps for the functions themselves.
   */
  @Test
  void wrappingKeepsTheDirection() {
    SplittableRandom random = new SplittableRandom(11);
    for (int i = 0; i < 20_000; i++) {
      double angle = random.nextDouble(-2000, 2000);
      double wrapped = Angle.wrap(angle);
      assertInRange(angle);
      double turns = Math.abs(angle) / (2 * Math.PI);
      double tolerance = 2 * 0x1p-52 + 9.5e-16 * turns;
      assertWithin("sine of " + angle, Math.sin(angle), Math.sin(wrapped), tolerance, 1);
      assertWithin("cosine of " + angle, Math.cos(angle), Math.cos(wrapped), tolerance, 1);
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
  void whatIsNotFiniteBecomesNaN(double angle) {
    assertTrue(Double.isNaN(Angle.wrap(angle)));
  }

  /** Differences of bearings (degrees) that practice stumbles over; plain arithmetic. */
  @Test
  void differencesAcrossTheSeam() {
    double tolerance = 4 * 0x1p-52;
    double difference = Angle.wrap(Math.toRadians(179) - Math.toRadians(-179));
    assertWithin("179 - (-179)", Math.toRadians(-2), difference, tolerance, Math.PI);
    difference = Angle.wrap(Math.toRadians(-170) - Math.toRadians(170));
    assertWithin("-170 - 170", Math.toRadians(20), difference, tolerance, Math.PI);
  }
}

package dev.estimation.core.space;

import static dev.estimation.testing.Agreement.assertSameBits;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.Rotations;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** The convention, the accuracy from 1e-300 rad to pi, and what is no rotation. */
class UnitQuaternionTest {
  private static final Space SPACE = Space.unitQuaternion();
  private static final double EPSILON = 0x1p-52;
  private static final double[] NONE = {1, 0, 0, 0};

  private static double[] displaced(double[] q, double... v) {
    double[] result = new double[4];
    SPACE.displace(q, v, result);
    return result;
  }

  private static double[] difference(double[] a, double[] b) {
    double[] result = new double[3];
    SPACE.difference(a, b, result);
    return result;
  }

  /** 90 degrees about x, then 90 degrees about the new z: (1 + i)(1 + k) / 2 = (1 + i - j + k) / 2. */
  @Test
  void scalarFirstAndTurnedFrame() {
    double right = Math.PI / 2;
    double[] aboutX = displaced(NONE, right, 0, 0);
    assertVector(
        "about x", new double[] {Math.sqrt(0.5), Math.sqrt(0.5), 0, 0}, aboutX, EPSILON, 1);
    double[] both = displaced(aboutX, 0, 0, right);
    assertVector("then z", new double[] {0.5, 0.5, -0.5, 0.5}, both, 2 * EPSILON, 1);
    assertVector("back", new double[] {0, 0, right}, difference(both, aboutX), 4 * EPSILON, 1);
    // As seen from none: 120 degrees about (1, -1, 1).
    double part = 2 * Math.PI / 3 / Math.sqrt(3);
    assertVector("all", new double[] {part, -part, part}, difference(both, NONE), 4 * EPSILON, 1);
  }

  /** Relative to the length, whatever it is: a few roundings. */
  @Test
  void smallRotationsKeepTheirDigits() {
    SplittableRandom random = new SplittableRandom(1);
    for (double length = 1e-300; length < 3; length *= 1.7) {
      double[] v = Rotations.vector(random, 1);
      double scale = length / Math.hypot(Math.hypot(v[0], v[1]), v[2]);
      double[] wanted = {scale * v[0], scale * v[1], scale * v[2]};
      double[] got = difference(displaced(NONE, wanted), NONE);
      assertVector("at " + length + " rad", wanted, got, 4 * EPSILON, length);
    }
  }

  /** Both forms of each function where one takes over from the other, against the exact values. */
  @Test
  void formsMeet() {
    for (double angle : new double[] {0.99e-4, 1.01e-4, 1.99e-4, 2.01e-4, 2.1e-4}) {
      double[] q = displaced(NONE, 0, angle, 0);
      assertWithin("sine", Math.sin(angle / 2), q[2], 2 * EPSILON, angle);
      double[] exact = {Math.cos(angle / 2), 0, Math.sin(angle / 2), 0};
      assertWithin("log", angle, difference(exact, NONE)[1], 2 * EPSILON, angle);
    }
  }

  @Test
  void nearHalfATurn() {
    for (double less : new double[] {1e-3, 1e-8, 1e-15, 0}) {
      double angle = Math.PI - less;
      double[] q = displaced(NONE, 0, 0, angle);
      assertWithin("at pi less " + less, angle, difference(q, NONE)[2], 2 * EPSILON, angle);
    }
    // Beyond it, the short way is the other one; rounding of pi.
    double[] beyond = displaced(NONE, 0, 0, Math.PI + 0.1);
    assertWithin("beyond", 0.1 - Math.PI, difference(beyond, NONE)[2], 8 * EPSILON, 1);
    assertEquals(Math.PI, Math.abs(difference(new double[] {0, 0, 1, 0}, NONE)[1]));
  }

  @Test
  void theSignOfAQuaternionDoesNotMatter() {
    SplittableRandom random = new SplittableRandom(2);
    for (int i = 0; i < 500; i++) {
      double[] a = Rotations.random(random);
      double[] b = Rotations.random(random);
      double[] minus = {-a[0], -a[1], -a[2], -a[3]};
      assertSameBits("a", difference(a, b), difference(minus, b));
      assertVector("b", difference(b, a), difference(b, minus), 0, 1);
      assertVector("itself", new double[3], difference(minus, a), 0, 1);
    }
  }

  /** Neither 1e-70 nor 1e70 times a quaternion changes a difference; displacing mends both. */
  @Test
  void lengthsDoNotMatter() {
    double[] q = {0.5, -0.5, 0.5, 0.5};
    double[] p = displaced(q, 0.3, 0.2, 0.1);
    for (double scale : new double[] {1e-70, 0.7, 1e70}) {
      double[] scaled = {scale * p[0], scale * p[1], scale * p[2], scale * p[3]};
      assertVector("from q", difference(p, q), difference(scaled, q), 4 * EPSILON, 1);
      assertVector("mended", p, displaced(scaled, 0, 0, 0), 2 * EPSILON, 1);
    }
  }

  /** However many turns, the length has the rounding of one. */
  @Test
  void theLengthIsHeld() {
    double[] q = NONE.clone();
    for (int i = 0; i < 100_000; i++) {
      SPACE.displace(q, new double[] {0.01, -0.02, 0.015}, q);
    }
    double square = q[0] * q[0] + q[1] * q[1] + q[2] * q[2] + q[3] * q[3];
    assertWithin("length squared", 1, square, 8 * EPSILON, 1);
  }

  @Test
  void lengthsWithinAThousandthAreTaken() {
    assertTrue(SPACE.contains(new double[] {0.7071, 0.7071, 0, 0}), "four decimals");
    assertTrue(SPACE.contains(new double[] {0, 1.0009, 0, 0}));
    assertTrue(SPACE.contains(new double[] {0, 0, 0, -0.9991}));
    assertFalse(SPACE.contains(new double[] {0, 1.0011, 0, 0}));
    assertFalse(SPACE.contains(new double[] {0.9989, 0, 0, 0}));
    assertFalse(SPACE.contains(new double[4]), "zero");
  }

  @Test
  void whatIsNoRotationGivesNotANumber() {
    assertAllNaN(difference(new double[4], NONE));
    assertAllNaN(difference(NONE, new double[4]));
    assertAllNaN(displaced(new double[4], 0.1, 0, 0));
    for (int i = 0; i < 4; i++) {
      double[] broken = {0.5, 0.5, 0.5, 0.5};
      broken[i] = Double.NaN;
      assertAllNaN(difference(broken, NONE));
      assertAllNaN(difference(NONE, broken));
      assertAllNaN(displaced(broken, 0, 0, 0));
    }
    assertAllNaN(displaced(NONE, 0, Double.NaN, 0));
    assertAllNaN(displaced(NONE, 0, Double.POSITIVE_INFINITY, 0));
  }

  private static void assertAllNaN(double[] values) {
    for (double value : values) {
      assertTrue(Double.isNaN(value), () -> "got " + value);
    }
  }
}

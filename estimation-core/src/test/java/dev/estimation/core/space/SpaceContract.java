package dev.estimation.core.space;

import static dev.estimation.testing.Agreement.assertSameBits;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** The laws of every space. Points and tangents come from the subclass. */
abstract class SpaceContract {
  /** The space. */
  abstract Space space();

  /** A random point. */
  abstract double[] point(SplittableRandom random);

  /** A random difference, within the range of differences. */
  abstract double[] tangent(SplittableRandom random);

  /** Rounding of a sum of numbers of the size of the points, to 1e3: a few eps. */
  private static final double ROUNDING = 4 * 0x1p-52 * 1e3;

  @Test
  void displacingByADifferenceArrives() {
    SplittableRandom random = new SplittableRandom(101);
    for (int i = 0; i < 2000; i++) {
      double[] a = point(random);
      double[] b = point(random);
      double[] apart = new double[space().dimension()];
      double[] arrived = new double[space().storage()];
      space().difference(a, b, apart);
      space().displace(b, apart, arrived);
      double[] rest = new double[space().dimension()];
      space().difference(arrived, a, rest);
      assertVector("displace(b, a - b) - a", new double[rest.length], rest, ROUNDING, 1);
    }
  }

  @Test
  void theDifferenceAfterADisplacementIsTheTangent() {
    SplittableRandom random = new SplittableRandom(102);
    for (int i = 0; i < 2000; i++) {
      double[] b = point(random);
      double[] wanted = tangent(random);
      double[] moved = new double[space().storage()];
      double[] got = new double[space().dimension()];
      space().displace(b, wanted, moved);
      space().difference(moved, b, got);
      assertVector("tangent", wanted, got, ROUNDING, 1);
    }
  }

  @Test
  void aPointDiffersFromItselfByZero() {
    double[] a = point(new SplittableRandom(103));
    double[] apart = new double[space().dimension()];
    space().difference(a, a.clone(), apart);
    assertSameBits("a - a", new double[apart.length], apart);
  }

  @Test
  void argumentsAreReadOnly() {
    SplittableRandom random = new SplittableRandom(104);
    double[] a = point(random);
    double[] b = point(random);
    double[] t = tangent(random);
    double[] aBefore = a.clone();
    double[] bBefore = b.clone();
    double[] tBefore = t.clone();
    space().difference(a, b, new double[t.length]);
    space().displace(a, t, new double[a.length]);
    assertSameBits("a", aBefore, a);
    assertSameBits("b", bBefore, b);
    assertSameBits("tangent", tBefore, t);
  }

  @Test
  void theResultMayBeThePointItself() {
    SplittableRandom random = new SplittableRandom(105);
    double[] a = point(random);
    double[] t = tangent(random);
    double[] wanted = new double[a.length];
    space().displace(a, t, wanted);
    space().displace(a, t, a);
    assertSameBits("displaced in place", wanted, a);
  }

  @Test
  void theDifferenceMayOverwriteEitherPoint() {
    assumeTrue(space().storage() == space().dimension(), "arrays of one length");
    SplittableRandom random = new SplittableRandom(106);
    double[] a = point(random);
    double[] b = point(random);
    double[] wanted = new double[a.length];
    space().difference(a, b, wanted);
    double[] overA = a.clone();
    space().difference(overA, b, overA);
    assertSameBits("over a", wanted, overA);
    space().difference(a, b, b);
    assertSameBits("over b", wanted, b);
  }

  @Test
  void notANumberPassesThrough() {
    double[] a = point(new SplittableRandom(107));
    double[] apart = new double[space().dimension()];
    double[] broken = a.clone();
    broken[0] = Double.NaN;
    space().difference(broken, a, apart);
    assertTrue(Double.isNaN(apart[0]));
    double[] moved = new double[a.length];
    space().displace(broken, new double[apart.length], moved);
    assertTrue(Double.isNaN(moved[0]));
    assertEquals(a.length, moved.length);
  }
}

package dev.estimation.core.space;

import static dev.estimation.testing.Agreement.assertSameBits;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.util.Arrays;
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

  /** The error that rounding may make in a difference; unless overridden, with points to 1e3: a few eps. */
  double rounding() {
    return 4 * 0x1p-52 * 1e3;
  }

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
      assertVector("displace(b, a - b) - a", new double[rest.length], rest, rounding(), 1);
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
      assertVector("tangent", wanted, got, rounding(), 1);
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

  @Test
  void resultsAreStandardPoints() {
    SplittableRandom random = new SplittableRandom(108);
    for (int i = 0; i < 2000; i++) {
      double[] moved = new double[space().storage()];
      space().displace(point(random), tangent(random), moved);
      assertTrue(space().contains(moved));
      double[] again = new double[moved.length];
      space().displace(moved, new double[space().dimension()], again);
      assertSameBits("displaced by zero", moved, again);
    }
  }

  @Test
  void pointsAreContainedAndOthersAreNot() {
    double[] a = point(new SplittableRandom(109));
    assertTrue(space().contains(a));
    assertFalse(space().contains(Arrays.copyOf(a, a.length + 1)));
    for (int i = 0; i < a.length; i++) {
      for (double bad : new double[] {Double.NaN, Double.POSITIVE_INFINITY}) {
        double[] broken = a.clone();
        broken[i] = bad;
        assertFalse(space().contains(broken), "component " + i + " is " + bad);
      }
    }
  }

  /** Operations on parts are those on the whole, and touch nothing else. */
  @Test
  void partsOfLongerArraysAreTreatedAlike() {
    SplittableRandom random = new SplittableRandom(110);
    double[] a = point(random);
    double[] b = point(random);
    double[] t = tangent(random);
    double[] apart = new double[t.length];
    space().difference(a, b, apart);
    double[] longer = embedded(apart.length, 2, new double[apart.length]);
    space().difference(embedded(a.length, 1, a), embedded(b.length, 1, b), 1, longer, 2);
    assertSameBits("difference", embedded(apart.length, 2, apart), longer);
    double[] moved = new double[a.length];
    space().displace(a, t, moved);
    double[] inPlace = embedded(a.length, 1, a);
    space().displace(inPlace, embedded(t.length, 2, t), 2, inPlace, 1);
    assertSameBits("displaced", embedded(moved.length, 1, moved), inPlace);
    assertTrue(space().contains(inPlace, 1));
  }

  private static double[] embedded(int size, int start, double[] part) {
    double[] longer = new double[size + 3];
    Arrays.fill(longer, Math.PI * 1e20);
    System.arraycopy(part, 0, longer, start, size);
    return longer;
  }

  /** A product knows the space again as its first and as its last factor. */
  @Test
  void aProductTreatsItsFactorsAlike() {
    SplittableRandom random = new SplittableRandom(111);
    Space other = Space.unitQuaternion();
    double[] q = {0.5, -0.5, 0.5, 0.5};
    double[] v = {0.1, 0.2, -0.3};
    double[] a = point(random);
    double[] t = tangent(random);
    double[] moved = new double[a.length];
    double[] turned = new double[4];
    space().displace(a, t, moved);
    other.displace(q, v, turned);
    double[] both = new double[a.length + 4];
    space().and(other).displace(joined(a, q), joined(t, v), both);
    assertSameBits("first", joined(moved, turned), both);
    other.and(space()).displace(joined(q, a), joined(v, t), both);
    assertSameBits("last", joined(turned, moved), both);
    double[] apart = new double[t.length + 3];
    double[] movedBack = new double[t.length];
    space().difference(moved, a, movedBack);
    other.difference(turned, q, v);
    space().and(other).difference(joined(moved, turned), joined(a, q), apart);
    assertSameBits("difference", joined(movedBack, v), apart);
  }

  private static double[] joined(double[] first, double[] second) {
    double[] all = Arrays.copyOf(first, first.length + second.length);
    System.arraycopy(second, 0, all, first.length, second.length);
    return all;
  }

  @Test
  void spacesAreEqualByValue() {
    assertEquals(space(), space());
    assertEquals(space().hashCode(), space().hashCode());
    assertEquals(space().and(space()), space().and(space()));
    assertNotEquals(space(), space().and(space()));
  }
}

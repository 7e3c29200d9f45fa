package dev.estimation.core.gaussian;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Mutable moments: values go in and out unchanged, and the factor is never stale. */
class MomentsTest {
  private final RandomGaussians random = new RandomGaussians(17);

  @Test
  void aGaussianGoesInAndOutUnchanged() {
    Gaussian value = random.gaussian(4);
    Moments moments = RandomGaussians.momentsOf(value);
    assertEquals(value, moments.toGaussian());
    assertNotSame(value.mean(), moments.mean());
  }

  @Test
  void changesDoNotReachTheGaussian() {
    Gaussian value = random.gaussian(3);
    double before = value.covariance(0, 0);
    Moments moments = RandomGaussians.momentsOf(value);
    moments.changeCovariance().set(0, 0, 99);
    moments.changeMean()[0] = 99;
    assertEquals(before, value.covariance(0, 0));
  }

  @Test
  void theFactorFollowsEveryChangeOfTheCovariance() {
    Moments moments = random.moments(3);
    assertTrue(moments.factor());
    double before = moments.lowerFactor().get(0, 0);
    DMatrixRMaj covariance = moments.changeCovariance();
    covariance.set(0, 0, 4 * covariance.get(0, 0));
    assertTrue(moments.factor());
    // Twice the square root of the same number: two roundings.
    assertEquals(2 * before, moments.lowerFactor().get(0, 0), 4 * 0x1p-52 * before);
    moments.set(Gaussian.independent(new double[3], new double[] {3, 2, 1}));
    assertTrue(moments.factor());
    assertEquals(2, moments.lowerFactor().get(1, 1));
  }

  @Test
  void aFailedFactorSaysWhereAndRecovers() {
    Moments moments = random.moments(3);
    DMatrixRMaj covariance = moments.changeCovariance();
    double kept = covariance.get(2, 2);
    covariance.set(2, 2, -5);
    assertFalse(moments.factor());
    assertFalse(moments.factor(), "failure is not remembered as success");
    assertNames(moments.factorFailure(), "pivot 3 of 3", "-");
    assertThrows(IllegalArgumentException.class, moments::toGaussian);
    moments.changeCovariance().set(2, 2, kept);
    assertTrue(moments.factor());
  }

  @Test
  void copiesTakeTheFactorAlong() {
    Moments source = random.moments(4);
    assertTrue(source.factor());
    Moments copy = new Moments(Space.reals(4));
    copy.set(source);
    DMatrixRMaj wanted = source.lowerFactor().copy();
    source.changeCovariance().zero();
    assertTrue(copy.factor());
    assertSameBits("factor", wanted, copy.lowerFactor());
    copy.set(source);
    assertTrue(copy.factor());
    assertSameBits("factor", new DMatrixRMaj(4, 4), copy.lowerFactor());
  }

  @Test
  void aCopyWithoutFactorForgetsTheOldOne() {
    Moments copy = random.moments(2);
    assertTrue(copy.factor());
    Moments source = new Moments(Space.reals(2));
    source.set(Gaussian.independent(new double[2], new double[] {7, 8}));
    copy.set(source);
    assertTrue(copy.factor());
    assertEquals(7, copy.lowerFactor().get(0, 0));
  }

  @Test
  void wrongSizesAreRefused() {
    Moments moments = new Moments(Space.reals(3));
    Gaussian small = random.gaussian(2);
    Moments large = random.moments(4);
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> moments.set(small)).getMessage(),
        "2",
        "3");
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> moments.set(large)).getMessage(),
        "3",
        "4");
  }

  @Test
  void theSpaceIsKept() {
    Space space = Space.reals(1).and(Space.angles(1));
    assertEquals(space, new Moments(space).space());
  }
}

package dev.estimation.core.gaussian;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

/** Means that have more numbers than the covariance has rows, and what is no point of a space. */
class GaussianInSpaceTest {
  private static final Space SPACE = Space.unitQuaternion().and(Space.angles(1));
  private static final double[] MEAN = {0.5, -0.5, 0.5, 0.5, 1};
  private static final double[] DEVIATIONS = {0.1, 0.2, 0.3, 0.4};

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  @Test
  void theDimensionIsThatOfTheCovariance() {
    Gaussian value = Gaussian.independent(SPACE, MEAN, DEVIATIONS);
    assertEquals(4, value.dimension());
    assertSameBits("mean", MEAN, value.mean());
    assertEquals(1, value.mean(4));
    assertEquals(0.4, value.standardDeviation(3));
    assertEquals(4, value.covariance().numRows);
    assertNames(value.toString(), "[0.5, -0.5, 0.5, 0.5, 1.0]", "0.4]");
    DMatrixRMaj matrix = value.covariance();
    assertEquals(value, Gaussian.of(SPACE, MEAN, matrix));
    double[][] rows = new double[4][4];
    for (int i = 0; i < 4; i++) {
      rows[i][i] = matrix.get(i, i);
    }
    assertEquals(value, Gaussian.of(SPACE, MEAN, rows));
    double[] other = MEAN.clone();
    other[4] = 2;
    assertNotEquals(value, Gaussian.of(SPACE, other, matrix));
  }

  /** Four decimals are taken and made a unit quaternion; angles come into their range. */
  @Test
  void theMeanIsBroughtIntoTheSpace() {
    double[] printed = {0.7071, 0, 0.7071, 0, 4};
    Gaussian value = Gaussian.independent(SPACE, printed, DEVIATIONS);
    // Rounding of a division and of 2 pi.
    assertEquals(Math.sqrt(0.5), value.mean(0), 2e-16);
    assertEquals(4 - 2 * Math.PI, value.mean(4), 1e-15);
    assertEquals(4.0, printed[4], "the array is copied");
  }

  @Test
  void momentsTakeAndGiveIt() {
    Gaussian value = Gaussian.independent(SPACE, MEAN, DEVIATIONS);
    Moments moments = new Moments(SPACE);
    moments.set(value);
    assertEquals(value, moments.toGaussian());
    Moments copy = new Moments(SPACE);
    copy.set(moments);
    assertEquals(value, copy.toGaussian());
  }

  @Test
  void whatIsNoPointIsRefused() {
    double[] zero = new double[5];
    assertRefused(
        () -> Gaussian.independent(SPACE, zero, DEVIATIONS), "unit quaternion", "[0.0, 0.0");
    double[] longer = {0, 1.0011, 0, 0, 1};
    assertRefused(() -> Gaussian.of(SPACE, longer, new double[4][4]), "unit quaternion", "1.0011");
    double[] broken = {0.5, 0.5, Double.NaN, 0.5, 1};
    assertRefused(
        () -> Gaussian.of(SPACE, broken, new DMatrixRMaj(4, 4)), "mean[2]", "finite", "NaN");
  }

  @Test
  void wrongShapesAreRefused() {
    assertRefused(
        () -> Gaussian.of(SPACE, new double[4], new double[4][4]), "length 5", "quaternion", "4");
    assertRefused(
        () -> Gaussian.of(SPACE, MEAN, new double[5][5]), "4 x 4", "quaternion", "5 rows");
    assertRefused(
        () -> Gaussian.of(SPACE, MEAN, new DMatrixRMaj(5, 5)), "4 x 4", "quaternion", "5 x 5");
    assertRefused(
        () -> Gaussian.independent(SPACE, MEAN, new double[5]), "standardDeviations", "4", "5");
  }

  /** Moments of a quaternion take neither a plain vector nor another order of factors. */
  @Test
  void momentsRefuseWhatIsOfAnotherSpace() {
    Moments moments = new Moments(Space.unitQuaternion());
    assertRefused(
        () -> moments.set(Gaussian.independent(new double[] {1, 0, 0, 0}, new double[4])),
        "dimension 3",
        "4");
    assertRefused(
        () -> moments.set(Gaussian.independent(new double[3], new double[3])), "quaternion", "0.0");
    Gaussian swapped = Gaussian.independent(
        Space.angles(1).and(Space.unitQuaternion()), new double[] {3, 1, 0, 0, 0}, DEVIATIONS);
    assertRefused(() -> new Moments(SPACE).set(swapped), "(unit quaternion) x (angle)", "3.0");
    assertRefused(() -> moments.set(new Moments(Space.reals(4))), "dimension 3", "4");
  }
}

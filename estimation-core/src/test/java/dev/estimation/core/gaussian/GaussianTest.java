package dev.estimation.core.gaussian;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What the factories take, what they refuse and how they say it; nothing can be changed later. */
class GaussianTest {
  private static final double[] MEAN = {1, -2};

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  private static Gaussian of(double a, double b, double c, double d) {
    return Gaussian.of(MEAN, new double[][] {{a, b}, {c, d}});
  }

  @Test
  void valuesComeBackAsGiven() {
    Gaussian value = of(4, -1, -1, 9);
    assertEquals(2, value.dimension());
    assertEquals(-2, value.mean(1));
    assertEquals(-1, value.covariance(0, 1));
    assertEquals(3, value.standardDeviation(1));
    assertSameBits("mean", MEAN, value.mean());
    assertEquals(value, Gaussian.of(MEAN, value.covariance()));
    assertEquals(value.hashCode(), Gaussian.of(MEAN, value.covariance()).hashCode());
    assertNotEquals(value, of(4, -1, -1, 9.5));
    assertNotEquals(value, Gaussian.of(new double[] {1, 2}, value.covariance()));
    assertNames(value.toString(), "-2.0", "3.0");
  }

  @Test
  void independentComponents() {
    Gaussian value = Gaussian.independent(MEAN, new double[] {0.5, 0});
    assertEquals(0.25, value.covariance(0, 0));
    assertEquals(0, value.covariance(1, 1));
    assertEquals(0, value.covariance(1, 0));
    assertRefused(() -> Gaussian.independent(MEAN, new double[3]), "standardDeviations", "2", "3");
    assertRefused(
        () -> Gaussian.independent(MEAN, new double[] {1, -0.5}), "standardDeviations[1]", "-0.5");
    assertRefused(
        () -> Gaussian.independent(MEAN, new double[] {Double.NaN, 1}),
        "standardDeviations[0]",
        "NaN");
    assertRefused(
        () -> Gaussian.independent(MEAN, new double[] {1, Double.POSITIVE_INFINITY}),
        "[1][1]",
        "Infinity");
  }

  @Test
  void wrongShapesAreRefused() {
    assertRefused(() -> Gaussian.of(new double[0], new double[0][0]), "mean", "at least 1", "0");
    assertRefused(() -> Gaussian.of(MEAN, new double[3][3]), "2 x 2", "3 rows");
    assertRefused(() -> Gaussian.of(MEAN, new double[][] {{1, 0}, {0}}), "2 x 2", "row 1", "1");
    assertRefused(() -> Gaussian.of(MEAN, new DMatrixRMaj(2, 3)), "2 x 2", "2 x 3");
    assertRefused(() -> Gaussian.of(MEAN, new DMatrixRMaj(3, 2)), "2 x 2", "3 x 2");
  }

  @ParameterizedTest
  @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
  void everyNumberMustBeFinite(double bad) {
    String text = Double.toString(bad);
    assertRefused(() -> Gaussian.of(new double[] {0, bad}, new double[2][2]), "mean[1]", text);
    assertRefused(() -> of(1, 0, 0, bad), "covariance[1][1]", text);
    assertRefused(() -> of(bad, 0, 0, 1), "covariance[0][0]", text);
    assertRefused(() -> of(1, 0, bad, 1), "covariance[1][0]", text);
    assertRefused(() -> of(1, bad, 0, 1), "covariance[0][1]", text);
    assertRefused(() -> of(1, bad, bad, 1), "covariance[0][1]", text);
  }

  /** 1e-12 sqrt(p_ii p_jj) is the stated limit; the lower triangle is the one used. */
  @Test
  void symmetryIsRelativeToTheDiagonal() {
    double lower = 0.5;
    Gaussian value = of(1, lower + 5e-13, lower, 1);
    assertEquals(lower, value.covariance(0, 1));
    assertEquals(lower, value.covariance(1, 0));
    assertRefused(() -> of(1, lower + 2e-12, lower, 1), "symmetric", "0.5", "[1][0]", "[0][1]");
    // Small and large variances: the same relative limit.
    assertEquals(0, of(1e-200, 5e-213, 0, 1e-200).covariance(0, 1));
    assertRefused(() -> of(1e-200, 2e-212, 0, 1e-200), "symmetric", "2.0E-212");
    assertEquals(0, of(1e200, 5e187, 0, 1e200).covariance(0, 1));
    assertRefused(() -> of(1e300, 2e288, 0, 1e300), "symmetric", "2.0E288");
  }

  @Test
  void indefiniteIsRefusedWithThePivot() {
    // Pivot 1 - 2^2 = -3.
    assertRefused(() -> of(1, 2, 2, 1), "pivot 2 of 2", "-3.0", "largest diagonal 1.0");
    assertRefused(() -> of(-1, 0, 0, 4), "pivot 1 of 2", "-1.0", "largest diagonal 4.0");
    // Twenty times n eps below zero is not rounding.
    assertRefused(() -> of(1, 1, 1, 1 - 40 * 0x1p-52), "pivot 2 of 2");
  }

  @Test
  void aZeroVarianceWithACovarianceIsRefused() {
    assertRefused(() -> of(0, 1e-9, 1e-9, 1), "pivot 1 of 2 is 0.0");
    assertRefused(() -> of(1, 1e-9, 1e-9, 0), "pivot 2 of 2", "-1.0");
    assertEquals(0, of(0, 0, 0, 1).standardDeviation(0));
    assertEquals(0, of(0, 0, 0, 0).standardDeviation(1));
  }

  @Test
  void nothingGivenOrReturnedIsShared() {
    double[] mean = {1, 2};
    double[][] rows = {{1, 0}, {0, 1}};
    DMatrixRMaj matrix = new DMatrixRMaj(rows);
    Gaussian fromRows = Gaussian.of(mean, rows);
    Gaussian fromMatrix = Gaussian.of(mean, matrix);
    mean[0] = 99;
    rows[1][1] = 99;
    matrix.set(0, 0, 99);
    fromRows.mean()[1] = 99;
    fromRows.covariance().set(1, 0, 99);
    Gaussian wanted = Gaussian.independent(new double[] {1, 2}, new double[] {1, 1});
    assertEquals(wanted, fromRows);
    assertEquals(wanted, fromMatrix);
    double[] deviations = {1, 1};
    Gaussian independent = Gaussian.independent(wanted.mean(), deviations);
    deviations[0] = 99;
    assertEquals(wanted, independent);
  }

  /** In EJML the length of data is a capacity, not a shape. */
  @Test
  void aMatrixWithSpareCapacityIsRead() {
    DMatrixRMaj roomy = new DMatrixRMaj(5, 5);
    roomy.reshape(2, 2);
    roomy.set(0, 0, 1);
    roomy.set(1, 1, 4);
    assertEquals(Gaussian.independent(MEAN, new double[] {1, 2}), Gaussian.of(MEAN, roomy));
  }
}

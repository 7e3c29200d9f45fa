package dev.estimation.core.function;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Angle;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Numerical derivatives against analytic ones, over 24 orders of magnitude of the input. */
class CentralDifferencesTest {
  /**
   * Truncation h^2 / 6 = 6e-12 and rounding eps / h = 4e-11, some of each: 1e-9 is ten times that.
   */
  private static final double ACCURACY = 1e-9;

  private static CentralDifferences scalar(VectorFunction function, double scale) {
    return new CentralDifferences(Space.reals(1), Space.reals(1), function, new double[] {scale});
  }

  private static double derivative(Jacobian jacobian, double at) {
    double[] result = new double[1];
    jacobian.evaluate(new double[] {at}, new double[1], result);
    return result[0];
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-12, 1e-9, 1e-6, 1e-3, 1, 1e3, 1e6, 1e9, 1e12})
  void theRightScaleGivesTenDigits(double scale) {
    CentralDifferences differences = scalar((u, given, z) -> z[0] = Math.sin(u[0] / scale), scale);
    for (double x : new double[] {-2, -0.3, 0, 0.1, 1, 3}) {
      double got = derivative(differences, x * scale) * scale;
      assertWithin("at " + x + " scales", Math.cos(x), got, ACCURACY, 1);
    }
  }

  /** A check that the scale matters: a hundred thousand times too large, and the slope is lost. */
  @Test
  void aScaleFarTooLargeIsNoticeable() {
    CentralDifferences differences = scalar((u, given, z) -> z[0] = Math.sin(u[0]), 1e5);
    assertTrue(Math.abs(derivative(differences, 0.3) - Math.cos(0.3)) > 1e-3);
  }

  @Test
  void inputsOfDifferentScale() {
    double[] scales = {1e-9, 1, 1e9};
    VectorFunction function = (u, given, z) -> {
      double sum = u[0] / scales[0] + u[1] / scales[1] + u[2] / scales[2];
      z[0] = Math.exp(sum / 3);
      z[1] = Math.sin(u[0] / scales[0]) * u[2] / scales[2];
    };
    CentralDifferences differences =
        new CentralDifferences(Space.reals(3), Space.reals(2), function, scales);
    double[] got = new double[6];
    differences.evaluate(new double[] {0.5e-9, -0.2, 0.7e9}, new double[0], got);
    double slope = Math.exp(1 / 3.0) / 3;
    double[] wanted = {slope, slope, slope, Math.cos(0.5) * 0.7, 0, Math.sin(0.5)};
    for (int i = 0; i < 6; i++) {
      got[i] *= scales[i % 3];
    }
    assertVector("scaled Jacobian", wanted, got, ACCURACY, 1);
  }

  @Test
  void agreesWithAnAnalyticJacobian() {
    for (int seed = 0; seed < 20; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      BentFunction bent = new BentFunction(5, 3, seed);
      double[] point = random.vector(5);
      double[] wanted = new double[15];
      bent.structure().jacobian().orElseThrow().evaluate(point, new double[1], wanted);
      double[] got = new double[15];
      new CentralDifferences(
              Space.reals(5), Space.reals(3), new PlainFunction(bent), new double[] {1, 1, 1, 1, 1})
          .evaluate(point, new double[1], got);
      // Values to 5 and slopes to 3.
      assertVector("Jacobian", wanted, got, ACCURACY, 5);
    }
  }

  /** The displacement is taken as rounded: a quadratic far from zero keeps its slope. */
  @Test
  void roundedDisplacementsAreAccountedFor() {
    CentralDifferences differences = scalar((u, given, z) -> z[0] = u[0] - 1e6, 1e-3);
    // Steps of 6e-9 beside 1e6 are rounded to multiples of 1e-10; the difference is then exact.
    assertEquals(1, derivative(differences, 1e6));
  }

  @Test
  void anglesMayCrossTheirSeam() {
    VectorFunction bearing = (u, given, z) -> z[0] = Math.atan2(u[1], u[0]);
    CentralDifferences differences =
        new CentralDifferences(Space.reals(2), Space.angles(1), bearing, new double[] {1, 1});
    double[] got = new double[2];
    differences.evaluate(new double[] {-2, 0}, new double[0], got);
    // d atan2 / d(x, y) = (-y, x) / r^2; numbers of size pi.
    assertVector("Jacobian", new double[] {0, -0.5}, got, ACCURACY, Math.PI);
    VectorFunction doubled = (u, given, z) -> z[0] = Math.sin(u[0]);
    double[] slope = new double[1];
    new CentralDifferences(Space.angles(1), Space.reals(1), doubled, new double[] {1})
        .evaluate(new double[] {-Math.PI}, new double[0], slope);
    assertWithin("slope at the seam", -1, slope[0], ACCURACY, 1);
    VectorFunction turned = (u, given, z) -> z[0] = Angle.wrap(u[0] + 3);
    new CentralDifferences(Space.angles(1), Space.angles(1), turned, new double[] {1})
        .evaluate(new double[] {Math.PI - 3}, new double[0], slope);
    assertWithin("slope of a turn", 1, slope[0], ACCURACY, Math.PI);
  }

  @Test
  void onlyActiveInputsAreDifferenced() {
    EmbeddedFunction function =
        new EmbeddedFunction(new PlainFunction(new BentFunction(2, 1, 3)), 1, 4, 3, 1);
    CentralDifferences differences =
        new CentralDifferences(Space.reals(4), Space.reals(1), function, new double[] {1, 1, 1, 1});
    assertEquals(4, differences.evaluations());
    double[] got = {9, 9, 9, 9};
    differences.evaluate(new double[] {Double.NaN, 0.1, Double.NaN, 0.4}, new double[1], got);
    assertEquals(0, got[0]);
    assertEquals(0, got[2]);
    assertTrue(Double.isFinite(got[1]) && Double.isFinite(got[3]));
  }

  @Test
  void whatIsNotANumberOrLeftOutIsNaN() {
    CentralDifferences broken = scalar((u, given, z) -> z[0] = Double.NaN, 1);
    assertTrue(Double.isNaN(derivative(broken, 0)));
    CentralDifferences empty = scalar((u, given, z) -> {}, 1);
    assertTrue(Double.isNaN(derivative(empty, 0)));
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, -1, Double.NaN, Double.POSITIVE_INFINITY})
  void scalesMustBeFiniteAndAboveZero(double scale) {
    VectorFunction function = (u, given, z) -> z[0] = u[0];
    IllegalArgumentException refusal =
        assertThrows(IllegalArgumentException.class, () -> scalar(function, scale));
    assertNames(refusal.getMessage(), "scales[0]", Double.toString(scale));
    refusal = assertThrows(
        IllegalArgumentException.class,
        () -> new CentralDifferences(Space.reals(2), Space.reals(1), function, new double[3]));
    assertNames(refusal.getMessage(), "scales", "2", "3");
  }
}

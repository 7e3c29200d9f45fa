package dev.estimation.core.function;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.RandomGaussians;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Numerical derivatives against analytic ones, over 24 orders of magnitude of input and output. */
class HessianDifferencesTest {
  /** From values: rounding 4 eps / h^2 = 6e-8 of outputs near 1, some of it for each of three terms. */
  private static final double FROM_VALUES = 3e-7;

  /** From Jacobians: as for first derivatives. */
  private static final double FROM_JACOBIANS = 1e-9;

  /** e^((a + b) / 2) and sin(a) b for a = u_0 / s_0, b = u_1 / s_1, times a size. */
  private static final class Scaled implements VectorFunction {
    private final double[] scales;
    private final double size;

    Scaled(double size, double... scales) {
      this.scales = scales;
      this.size = size;
    }

    @Override
    public void evaluate(double[] u, double[] given, double[] z) {
      z[0] = size * Math.exp((u[0] / scales[0] + u[1] / scales[1]) / 2);
      z[1] = size * Math.sin(u[0] / scales[0]) * u[1] / scales[1];
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withJacobian((u, given, jacobian) -> {
        double a = u[0] / scales[0];
        double b = u[1] / scales[1];
        jacobian[0] = size * Math.exp((a + b) / 2) / 2 / scales[0];
        jacobian[1] = size * Math.exp((a + b) / 2) / 2 / scales[1];
        jacobian[2] = size * Math.cos(a) * b / scales[0];
        jacobian[3] = size * Math.sin(a) / scales[1];
      });
    }

    /** In units of the scales and the size. */
    double[] hessians(double a, double b) {
      double e = Math.exp((a + b) / 2) / 4;
      return new double[] {e, e, e, e, -Math.sin(a) * b, Math.cos(a), Math.cos(a), 0};
    }

    /** The Jacobian by differences, in units of the scales and the size. */
    void checkJacobian(double tolerance) {
      Space plane = Space.reals(2);
      Jacobian differences = new CentralDifferences(plane, plane, this, scales);
      for (double a : new double[] {-1.3, 0, 0.6}) {
        double b = 0.5 - a;
        double[] got = new double[4];
        differences.evaluate(new double[] {a * scales[0], b * scales[1]}, new double[0], got);
        double e = Math.exp((a + b) / 2) / 2;
        double[] wanted = {e, e, Math.cos(a) * b, Math.sin(a)};
        for (int i = 0; i < 4; i++) {
          got[i] *= scales[i % 2] / size;
        }
        assertVector("scaled Jacobian", wanted, got, tolerance, 1);
      }
    }

    void check(Hessian hessian, double tolerance) {
      for (double a : new double[] {-1.3, 0, 0.6}) {
        double b = 0.5 - a;
        double[] got = new double[8];
        hessian.evaluate(new double[] {a * scales[0], b * scales[1]}, new double[0], got);
        for (int i = 0; i < 8; i++) {
          got[i] *= scales[i / 2 % 2] / size * scales[i % 2];
        }
        assertVector("scaled Hessian", hessians(a, b), got, tolerance, 1);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-12, 1e-9, 1e-6, 1e-3, 1, 1e3, 1e6, 1e9, 1e12})
  void theRightScalesGiveSevenOrTenDigits(double scale) {
    for (double other : new double[] {1e-12, 1, 1e12}) {
      for (double size : new double[] {1e-12, 1, 1e12}) {
        Scaled function = new Scaled(size, scale, other);
        double[] scales = {scale, other};
        Space plane = Space.reals(2);
        function.checkJacobian(FROM_JACOBIANS);
        function.check(new SecondDifferences(plane, plane, function, scales), FROM_VALUES);
        function.check(new JacobianDifferences(plane, plane, function, scales), FROM_JACOBIANS);
      }
    }
  }

  @Test
  void agreeWithAnAnalyticHessian() {
    for (int seed = 0; seed < 20; seed++) {
      BentFunction bent = new BentFunction(4, 3, seed);
      double[] ones = {1, 1, 1, 1};
      double[] point = new RandomGaussians(seed).vector(4);
      double[] lower = new double[48];
      bent.structure().hessian().orElseThrow().evaluate(point, new double[1], lower);
      double[] byValues = new double[48];
      new SecondDifferences(Space.reals(4), Space.reals(3), new PlainFunction(bent), ones)
          .evaluate(point, new double[1], byValues);
      double[] byJacobians = new double[48];
      new JacobianDifferences(Space.reals(4), Space.reals(3), bent, ones)
          .evaluate(point, new double[1], byJacobians);
      for (int i = 0; i < 48; i++) {
        int j = i / 4 % 4;
        int l = i % 4;
        double wanted = l <= j ? lower[i] : lower[i + (l - j) * 3];
        // Values to 5 and slopes to 3.
        assertWithin("from values", wanted, byValues[i], FROM_VALUES, 5);
        assertWithin("from Jacobians", wanted, byJacobians[i], FROM_JACOBIANS, 5);
      }
    }
  }

  /** Displacements are taken as rounded: far from zero a product keeps its curvature, 1. */
  @Test
  void roundedDisplacementsAreAccountedFor() {
    VectorFunction product = (u, given, z) -> z[0] = (u[0] - 1e9) * (u[1] - 1e9);
    double[] got = new double[4];
    new SecondDifferences(Space.reals(2), Space.reals(1), product, new double[] {1, 1})
        .evaluate(new double[] {1e9, 1e9}, new double[0], got);
    assertVector("Hessian", new double[] {0, 1, 1, 0}, got, 1e-15, 1);
  }

  @Test
  void anglesMayCrossTheirSeam() {
    VectorFunction bearing = (u, given, z) -> z[0] = Math.atan2(u[1], u[0]);
    double[] got = new double[4];
    new SecondDifferences(Space.reals(2), Space.angles(1), bearing, new double[] {1, 1})
        .evaluate(new double[] {-2, 0}, new double[0], got);
    // d2 atan2: 2 x y / r^4, (y^2 - x^2) / r^4, -2 x y / r^4; numbers of size pi.
    assertVector("Hessian", new double[] {0, -0.25, -0.25, 0}, got, FROM_VALUES, Math.PI);
  }

  @Test
  void onlyActiveInputsAreDifferenced() {
    EmbeddedFunction function = new EmbeddedFunction(new BentFunction(2, 1, 3), 1, 4, 3, 1);
    double[] scales = {1, 1, 1, 1};
    SecondDifferences values =
        new SecondDifferences(Space.reals(4), Space.reals(1), function, scales);
    JacobianDifferences slopes =
        new JacobianDifferences(Space.reals(4), Space.reals(1), function, scales);
    assertEquals(9, values.evaluations());
    assertEquals(4, slopes.jacobians());
    double[] point = {Double.NaN, 0.1, Double.NaN, 0.4};
    for (Hessian hessian : new Hessian[] {values, slopes}) {
      double[] got = new double[16];
      hessian.evaluate(point, new double[1], got);
      for (int i = 0; i < 16; i++) {
        boolean read = i / 4 % 2 == 1 && i % 2 == 1;
        assertTrue(read ? Double.isFinite(got[i]) && got[i] != 0 : got[i] == 0, "entry " + i);
      }
    }
  }

  @Test
  void whatIsNotANumberIsNaN() {
    VectorFunction broken = (u, given, z) -> {};
    double[] got = new double[1];
    new SecondDifferences(Space.reals(1), Space.reals(1), broken, new double[] {1})
        .evaluate(new double[1], new double[0], got);
    assertTrue(Double.isNaN(got[0]));
  }

  @Test
  void aMissingJacobianAndBadScalesAreRefused() {
    Space line = Space.reals(1);
    VectorFunction plain = (u, given, z) -> z[0] = u[0];
    String message = assertThrows(
            IllegalArgumentException.class,
            () -> new JacobianDifferences(line, line, plain, new double[] {1}))
        .getMessage();
    assertNames(message, "Jacobian", "none");
    message = assertThrows(
            IllegalArgumentException.class,
            () -> new SecondDifferences(line, line, plain, new double[] {0}))
        .getMessage();
    assertNames(message, "scales[0]", "0.0");
  }
}

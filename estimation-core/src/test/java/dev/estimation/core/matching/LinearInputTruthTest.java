package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.apache.commons.math3.complex.Complex;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Functions that are linear in some inputs, against closed forms; and what they cost. */
class LinearInputTruthTest {
  private static VectorFunction linearIn(VectorFunction values, int... linear) {
    Structure structure = values.structure().withLinearInputs(linear);
    return new Restructured(values, structure);
  }

  static Stream<ReferenceTable.Row> products() {
    return ReferenceTable.read("gaussian_products.csv").stream();
  }

  /**
   * x y, linear in y given x: the mean given x is quadratic, so its variance wants the fourth moment along
   * one axis, which these rules have. Rounding of numbers to 4, times 1e6 for the narrow rule.
   */
  @ParameterizedTest
  @MethodSource("products")
  void productsAreExact(ReferenceTable.Row row) {
    double sx = row.number("sx");
    double sy = row.number("sy");
    double c = row.number("rho") * sx * sy;
    Gaussian pair = Gaussian.of(new double[] {row.number("mx"), row.number("my")}, new double[][] {
      {sx * sx, c}, {c, sy * sy}
    });
    Moments input = RandomGaussians.momentsOf(pair);
    VectorFunction product = (u, given, z) -> z[0] = u[0] * u[1];
    for (String name : new String[] {
      "unscented 1 2 0",
      "unscented 1 0 3-n",
      "unscented 1e-3 2 0",
      "Gauss-Hermite 3",
      "Gauss-Hermite 9"
    }) {
      double tolerance = name.contains("e-3") ? 1e-9 : 1e-14;
      for (int linear = 0; linear < 2; linear++) {
        MatchingWorkspace work = NamedMatchings.of(name)
            .workspace(input.space(), Space.reals(1), linearIn(product, linear));
        Outcome got = Outcome.of(work, input);
        assertWithin(name, row.number("mean"), got.mean[0], tolerance, 4);
        assertWithin(name, row.number("variance"), got.covariance.get(0, 0), tolerance, 4);
        assertWithin(name, row.number("covariance_x"), got.cross().get(0, 0), tolerance, 4);
        assertWithin(name, row.number("covariance_y"), got.cross().get(1, 0), tolerance, 4);
      }
    }
  }

  /**
   * Velocities after a turn: v exp(i w t) with v = vx + i vy. Given a weight of exp(i k w t), the mean of v is
   * that of v plus i k t cov(v, w), its covariances are as they were: E v exp(i w t) = exp(i t m - t^2 s^2 / 2)
   * (E v + i t c), and so for v^2 with k = 2; |v| is as before. Derived here. The
   * deviation of the angle is 0.6 rad at most: 15 nodes are 5e-12 off, of 30 the rounding of numbers to 300 remains.
   */
  @Test
  void velocitiesAfterATurn() {
    DMatrixRMaj p = new RandomGaussians(4).covariance(5);
    scaleRate(p, 0.1);
    double[] mean = {1, -2, 8, -3, 0.2};
    double t = 3;
    Moments input = RandomGaussians.momentsOf(Gaussian.of(mean, p));
    double s = p.get(4, 4) * t * t;
    Complex v = new Complex(mean[2], mean[3]);
    Complex c = new Complex(p.get(2, 4), p.get(3, 4)).multiply(t);
    Complex turn = new Complex(0, mean[4] * t).exp();
    Complex first = turn.multiply(Math.exp(-s / 2)).multiply(v.add(c.multiply(Complex.I)));
    Complex tilted = v.add(c.multiply(Complex.I).multiply(2));
    Complex own = new Complex(p.get(2, 2) - p.get(3, 3), 2 * p.get(2, 3));
    Complex square = turn.multiply(turn)
        .multiply(Math.exp(-2 * s))
        .multiply(tilted.multiply(tilted).add(own));
    double length = v.abs() * v.abs() + p.get(2, 2) + p.get(3, 3);
    double xx = (length + square.getReal()) / 2 - first.getReal() * first.getReal();
    double yy = (length - square.getReal()) / 2 - first.getImaginary() * first.getImaginary();
    double xy = square.getImaginary() / 2 - first.getReal() * first.getImaginary();
    for (boolean derivatives : new boolean[] {false, true}) {
      MatchingWorkspace work = NamedMatchings.product(30)
          .workspace(input.space(), input.space(), new LinearTurn(derivatives));
      Outcome got = Outcome.of(work, input, new double[] {t}, null);
      assertWithin("vx", first.getReal(), got.mean[2], 1e-14, 10);
      assertWithin("vy", first.getImaginary(), got.mean[3], 1e-14, 10);
      assertWithin("var vx", xx, got.covariance.get(2, 2), 1e-14, 300);
      assertWithin("var vy", yy, got.covariance.get(3, 3), 1e-14, 300);
      assertWithin("cov", xy, got.covariance.get(2, 3), 1e-14, 300);
    }
  }

  private static void scaleRate(DMatrixRMaj p, double factor) {
    for (int i = 0; i < 5; i++) {
      p.set(i, 4, p.get(i, 4) * factor);
      p.set(4, i, p.get(4, i) * factor);
    }
  }

  /** A turn over five states costs what a function of the rate costs; A comes with the weights. */
  @Test
  void aTurnTakesThreeEvaluations() {
    assertCost("unscented 1 2 0", 3, 2);
    assertCost("unscented 0.5 2 0", 3, 3);
    assertCost("unscented 1e-3 2 0", 3, 3);
    assertCost("cubature 3", 3, 2);
    assertCost("Gauss-Hermite 3", 3, 3);
    assertCost("Gauss-Hermite 4", 5, 4);
    assertCost("Gauss-Hermite 5", 5, 5);
    assertCost("simplex", 3, 2);
  }

  private static void assertCost(String name, int evaluations, int jacobians) {
    Space space = Space.reals(5);
    Moments input = new RandomGaussians(5).moments(5);
    MomentMatching matching = NamedMatchings.of(name);
    MatchingWorkspace known = matching.workspace(space, space, new LinearTurn(true));
    Outcome.of(known, input);
    assertEquals(evaluations, known.evaluations(), name);
    assertEquals(jacobians, known.jacobians(), name);
    MatchingWorkspace plain = matching.workspace(space, space, new LinearTurn(false));
    Outcome.of(plain, input);
    assertEquals(evaluations + 4 * jacobians, plain.evaluations(), name);
    assertEquals(0, plain.jacobians(), name);
    MatchingWorkspace whole =
        matching.overWholeInput().workspace(space, space, new LinearTurn(true));
    Outcome.of(whole, input);
    assertTrue(whole.evaluations() >= 7, name);
    assertEquals(0, whole.jacobians(), name);
  }

  /** One evaluation and one Jacobian, or one evaluation more for each input; exact but for rounding. */
  @ParameterizedTest
  @ValueSource(
      strings = {"unscented 1e-3 2 0", "cubature 3", "Gauss-Hermite 8", "simplex 1/3", "cubature 5"
      })
  void linearInAllInputs(String name) {
    RandomGaussians random = new RandomGaussians(8);
    Moments input = random.moments(4);
    DMatrixRMaj a = random.matrix(3, 4);
    AffineFunction affine = new AffineFunction(a, random.vector(3));
    DMatrixRMaj half = new DMatrixRMaj(3, 4);
    DMatrixRMaj covariance = new DMatrixRMaj(3, 3);
    CommonOps_DDRM.mult(a, input.covariance(), half);
    CommonOps_DDRM.multTransB(half, a, covariance);
    DMatrixRMaj cross = CommonOps_DDRM.transpose(half, null);
    double[] mean = new double[3];
    affine.evaluate(input.mean(), new double[1], mean);
    VectorFunction plain = affine::evaluate;
    for (Form form : Form.values()) {
      for (VectorFunction function : new VectorFunction[] {affine, plain}) {
        VectorFunction declared = linearIn(function, 2, 0, 3, 1);
        MatchingWorkspace work =
            NamedMatchings.of(name).workspace(input.space(), Space.reals(3), declared, form);
        Outcome got = Outcome.of(work, input);
        assertVector("mean", mean, got.mean, 1e-15, 1);
        assertCovariance("covariance", covariance, got.covariance, 1e-13);
        assertMatrix("cross-covariance", cross, got.cross(), 1e-13, 1);
        assertMatrix("left", new DMatrixRMaj(3, 3), work.unexplained().matrix(), 0, 1);
        assertEquals(function == affine ? 1 : 5, work.evaluations());
        assertEquals(function == affine ? 1 : 0, work.jacobians());
      }
    }
  }

  /**
   * b cos(w), w about 0, where the slope of A = cos w vanishes: what regression leaves is the variance of cos w,
   * (1 + exp(-2 v)) / 2 - exp(-v) = v^2 / 2 to v^3. A narrow spread sees it by the mean of its deviations, with
   * beta; with the plain mean weights it would have the wrong sign.
   */
  @ParameterizedTest
  @ValueSource(strings = {"unscented 1e-3 2 0", "unscented 0.1 2 0", "Gauss-Hermite 5"})
  void aColumnAtItsTurningPoint(String name) {
    VectorFunction function = linearIn((u, given, z) -> z[0] = u[1] * Math.cos(u[0]), 1);
    double v = 0.01;
    Moments input = RandomGaussians.momentsOf(
        Gaussian.independent(new double[2], new double[] {Math.sqrt(v), 1}));
    double exact = (1 + Math.exp(-2 * v)) / 2 - Math.exp(-v);
    for (Form form : Form.values()) {
      MatchingWorkspace work =
          NamedMatchings.of(name).workspace(Space.reals(2), Space.reals(1), function, form);
      Outcome.of(work, input);
      // 2 v: the terms of v^3, relative to v^2 / 2.
      assertWithin(name, exact, work.unexplained().matrix().get(0, 0), 2 * v, exact);
    }
  }

  /**
   * A nearly singular covariance of the linear inputs through a narrow spread, with weights of 1e6: no digit is
   * lost beyond the rounding of the function itself. Deviations 1 and 1e-6 along the diagonals.
   */
  @Test
  void aNarrowSpreadKeepsSmallVariances() {
    VectorFunction function = linearIn(
        (u, given, z) -> {
          z[0] = (1 + 0.1 * u[0]) * u[1];
          z[1] = (1 + 0.1 * u[0]) * u[2];
        },
        1,
        2);
    VectorFunction known =
        new Restructured(function, function.structure().withJacobian((u, given, jacobian) -> {
          jacobian[1] = 1 + 0.1 * u[0];
          jacobian[5] = 1 + 0.1 * u[0];
        }));
    double small = 1e-12;
    Moments input = RandomGaussians.momentsOf(Gaussian.of(new double[3], new double[][] {
      {0.25, 0, 0}, {0, 1, 1 - small}, {0, 1 - small, 1}
    }));
    for (Form form : Form.values()) {
      MatchingWorkspace work = NamedMatchings.of("unscented 1e-3 2 0")
          .workspace(Space.reals(3), Space.reals(2), known, form);
      DMatrixRMaj got = Outcome.of(work, input).covariance;
      double scale = 1 + 0.01 * 0.25;
      double difference = got.get(0, 0) - 2 * got.get(0, 1) + got.get(1, 1);
      // The difference of two numbers near 1 has eps of them; 2e-12 is wanted.
      assertWithin("variance of z0 - z1", 2 * small * scale, difference, 1e-15, 1);
    }
  }
}

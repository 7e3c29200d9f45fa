package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AllocationMeter;
import dev.estimation.testing.ConditionallyLinearFunction;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.Rotations;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Linear inputs beside angles and rotations; faults; bytes. */
class LinearInputConductTest {
  /** A function with its structure. */
  private record Told(VectorFunction values, Structure structure) implements VectorFunction {
    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      values.evaluate(input, given, output);
    }
  }

  /**
   * A heading near the seam, a rate that it grows with, and a speed: linear in rate and speed. Nine nodes leave (4
   * 0.04)^9 9! / 18! = 4e-18, so rounding; the outer ones of twenty would lie half a turn from the mean.
   */
  @Test
  void angles() {
    VectorFunction values = (u, given, z) -> {
      z[0] = u[0] + 2 * u[2];
      z[1] = u[1] * Math.cos(u[0]);
    };
    Space input = Space.angles(1).and(Space.reals(2));
    Space output = Space.angles(1).and(Space.reals(1));
    Moments moments = new Moments(input);
    moments.set(Gaussian.of(input, new double[] {3.1, 2, 0.1}, new double[][] {
      {0.04, 0.03, 0.01}, {0.03, 0.25, 0.01}, {0.01, 0.01, 0.01}
    }));
    Told told = new Told(values, Structure.UNKNOWN.withLinearInputs(1, 2));
    Told known = new Told(values, told.structure.withJacobian((u, given, jacobian) -> {
      jacobian[2] = 2;
      jacobian[4] = Math.cos(u[0]);
    }));
    MomentMatching product = NamedMatchings.product(9);
    for (Form form : Form.values()) {
      MatchingWorkspace wanted =
          LinearInputs.carry(product, LinearInputs.undeclared(told), moments, output, form);
      for (Told function : new Told[] {told, known}) {
        MatchingWorkspace got = LinearInputs.carry(product, function, moments, output, form);
        LinearInputs.assertSame("angles", wanted, got, 1e-13);
      }
      assertWithin("past the seam", 3.3 - 2 * Math.PI, wanted.mean()[0], 1e-14, 1);
    }
  }

  /** (q, v) to (q turned by a rate, v + R(q) a): linear in v and a, whose indices are of the tangent. */
  private static Told push(boolean derivatives) {
    Space rotation = Space.unitQuaternion();
    VectorFunction values = (u, given, z) -> {
      rotation.displace(u, new double[] {0.1, -0.2, 0.3}, z);
      DMatrixRMaj turned = Rotations.matrix(u);
      for (int i = 0; i < 3; i++) {
        z[4 + i] = u[4 + i];
        for (int j = 0; j < 3; j++) {
          z[4 + i] += turned.get(i, j) * u[7 + j];
        }
      }
    };
    Structure linear = Structure.UNKNOWN.withLinearInputs(3, 4, 5, 6, 7, 8);
    return new Told(
        values,
        !derivatives
            ? linear
            : linear.withJacobian((u, given, jacobian) -> {
              DMatrixRMaj turned = Rotations.matrix(u);
              for (int i = 0; i < 3; i++) {
                jacobian[(3 + i) * 9 + 3 + i] = 1;
                for (int j = 0; j < 3; j++) {
                  jacobian[(3 + i) * 9 + 6 + j] = turned.get(i, j);
                }
              }
            }));
  }

  /**
   * Six linear inputs of nine, three of a rotation of 0.012 to 0.05 rad. Both are exact to degree 9, the grid over
   * all nine inputs. At four times the deviations they differ by 4e-8 of a variance, of the tenth order: here by
   * 4e-14, if that, beside rounding with weights of both signs. 1e-11.
   */
  @Test
  void rotations() {
    Space input = Space.unitQuaternion().and(Space.reals(6));
    Space output = Space.unitQuaternion().and(Space.reals(3));
    double[] mean = {0.5, 0.5, 0.5, 0.5, 1, 2, 3, -1, 0.5, 2};
    DMatrixRMaj p = new RandomGaussians(6).covariance(9);
    for (int i = 0; i < 9; i++) {
      for (int j = 0; j < 9; j++) {
        p.set(i, j, p.get(i, j) * 0.01 / (i < 3 ? 4 : 1) / (j < 3 ? 4 : 1));
      }
    }
    Moments moments = new Moments(input);
    moments.set(Gaussian.of(input, mean, p));
    for (Form form : Form.values()) {
      MatchingWorkspace wanted = LinearInputs.carry(
          PointMatching.of(SparseGridRule.ofDegree(9)),
          LinearInputs.undeclared(push(false)),
          moments,
          output,
          form);
      for (boolean derivatives : new boolean[] {false, true}) {
        MatchingWorkspace got =
            LinearInputs.carry(NamedMatchings.product(5), push(derivatives), moments, output, form);
        LinearInputs.assertSame("rotations", wanted, got, 1e-11);
        int images = 125 + (derivatives ? 0 : 125 * 6);
        assertEquals(images, got.evaluations());
      }
    }
  }

  /** A displaced evaluation that fails, and a Jacobian that is not finite, are told as such. */
  @Test
  void faultsAreTold() {
    Moments input = new RandomGaussians(2).moments(2);
    VectorFunction product = (u, given, z) -> z[0] = u[0] * u[1];
    Structure linear = Structure.UNKNOWN.withLinearInputs(1);
    double[] seen = new double[1];
    VectorFunction failing = (u, given, z) -> z[0] = ++seen[0] == 3 ? Double.NaN : u[0] * u[1];
    MomentMatching matching = NamedMatchings.of("cubature 3");
    MatchingWorkspace work =
        matching.workspace(Space.reals(2), Space.reals(1), new Told(failing, linear));
    assertEquals(MatchingStatus.FUNCTION_NOT_FINITE, work.carry(input, new double[1], null));
    assertNames(work.failure(), "output[0]", "NaN", "evaluation 3");
    Told broken = new Told(
        product,
        linear.withJacobian((u, given, jacobian) -> jacobian[1] = Double.POSITIVE_INFINITY));
    for (String name : new String[] {"cubature 3", "unscented 1e-3 2 0"}) {
      work = NamedMatchings.of(name).workspace(Space.reals(2), Space.reals(1), broken);
      assertEquals(MatchingStatus.JACOBIAN_NOT_FINITE, work.carry(input, new double[1], null));
      assertNames(work.failure(), "Jacobian[0][1]", "Infinity");
    }
  }

  /** Told, and the caller's moments are not what is written on. */
  @Test
  void functionsThatWriteOnTheirInput() {
    Moments input = new RandomGaussians(3).moments(3);
    Structure linear = Structure.UNKNOWN.withLinearInputs(0, 2);
    VectorFunction clean = (u, given, z) -> z[0] = Math.sin(u[1]) * u[0] + u[2];
    VectorFunction dirty = (u, given, z) -> {
      clean.evaluate(u, given, z);
      u[0] = u[1] = u[2] = 1e9;
    };
    double[] before = input.mean().clone();
    for (String name : new String[] {"unscented 0.5 2 0", "Gauss-Hermite 4"}) {
      MomentMatching matching = NamedMatchings.of(name);
      MatchingWorkspace work =
          matching.workspace(Space.reals(3), Space.reals(1), new Told(dirty, linear));
      assertEquals(MatchingStatus.FUNCTION_CHANGED_INPUT, work.carry(input, new double[1], null));
      assertArrayEquals(before, input.mean());
    }
  }

  @ParameterizedTest
  @MethodSource("dev.estimation.core.matching.RuleFamilies#all")
  void aCallAllocatesNothing(PointRule rule) {
    int[] active = {0, 1, 2, 3, 4};
    for (boolean derivatives : new boolean[] {false, true}) {
      for (int[] linear : new int[][] {{0, 1, 3, 4}, {4, 2}, {0, 1, 2, 3, 4}}) {
        VectorFunction function =
            ConditionallyLinearFunction.waves(5, 3, active, linear, derivatives);
        for (Form form : Form.values()) {
          checkBytes(PointMatching.of(rule), function, form);
        }
      }
    }
  }

  private static void checkBytes(MomentMatching matching, VectorFunction function, Form form) {
    Moments input = new RandomGaussians(7).moments(5);
    double[] given = new double[1];
    MatchingWorkspace work = matching.workspace(Space.reals(5), Space.reals(3), function, form);
    double bytes = AllocationMeter.bytesPerCall(500, 500, () -> {
      input.changeCovariance();
      if (work.carry(input, given, null) != MatchingStatus.MATCHED) {
        throw new IllegalStateException(work.failure());
      }
      work.unitCrossCovariance();
      work.unexplained();
    });
    assertEquals(0, bytes, form::toString);
  }
}

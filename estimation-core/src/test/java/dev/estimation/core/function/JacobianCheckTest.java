package dev.estimation.core.function;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.JacobianFinding.Kind;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Right derivatives pass however the inputs are scaled; wrong ones are named. */
class JacobianCheckTest {
  private static final double[] NONE = {};
  private static final FlatSpace SIGHT = Space.reals(1).and(Space.angles(1));

  /** What a user writes: values and a structure. */
  private record Offered(VectorFunction values, Structure structure) implements VectorFunction {
    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      values.evaluate(input, given, output);
    }
  }

  /** Range and bearing to a plane position, in units of {@code unit} metres, with an error put in. */
  private static VectorFunction sight(double unit, Jacobian error) {
    return new Offered(
        (u, given, z) -> {
          z[0] = Math.hypot(u[0], u[1]) * unit;
          z[1] = Math.atan2(u[1], u[0]);
        },
        Structure.UNKNOWN.withJacobian((u, given, jacobian) -> {
          double range = Math.hypot(u[0], u[1]);
          jacobian[0] = u[0] / range * unit;
          jacobian[1] = u[1] / range * unit;
          jacobian[2] = -u[1] / (range * range);
          jacobian[3] = u[0] / (range * range);
          error.evaluate(u, given, jacobian);
        }));
  }

  private static List<JacobianFinding> findings(Jacobian error) {
    JacobianCheck check = JacobianCheck.of(
        Space.reals(2), SIGHT, sight(1, error), new double[] {1, 1}, NONE, new double[] {3, -4});
    assertEquals(check.findings().isEmpty(), check.passed());
    return check.findings();
  }

  @Test
  void aRightJacobianPasses() {
    assertEquals(List.of(), findings((u, given, jacobian) -> {}));
  }

  @Test
  void aWrongSignIsNamed() {
    List<JacobianFinding> found = findings((u, given, jacobian) -> jacobian[2] *= -1);
    assertEquals(1, found.size(), found::toString);
    JacobianFinding finding = found.get(0);
    assertEquals(Kind.JACOBIAN, finding.kind());
    assertEquals(1, finding.row());
    assertEquals(0, finding.column());
    assertEquals(-4 / 25.0, finding.given());
    assertWithin("differenced", 4 / 25.0, finding.differenced(), 1e-9, 1);
    assertWithin("relative difference", 2, finding.relativeDifference(), 1e-6, 1);
    assertEquals(List.of(3.0, -4.0), finding.point());
    assertNames(finding.toString(), "Jacobian[1][0]", "-0.16", "0.16", "[3.0, -4.0]");
  }

  @Test
  void aSwappedPairIsNamedTwice() {
    List<JacobianFinding> found = findings((u, given, jacobian) -> {
      double first = jacobian[0];
      jacobian[0] = jacobian[1];
      jacobian[1] = first;
    });
    assertEquals(2, found.size(), found::toString);
    assertTrue(found.stream().allMatch(finding -> finding.row() == 0));
  }

  /** Degrees for radians: a factor from the chain rule is left out. */
  @Test
  void aMissingFactorIsNamed() {
    VectorFunction function = new Offered(
        (u, given, z) -> z[0] = Math.sin(Math.toRadians(u[0])),
        Structure.UNKNOWN.withJacobian(
            (u, given, jacobian) -> jacobian[0] = Math.cos(Math.toRadians(u[0]))));
    JacobianCheck check = JacobianCheck.of(
        Space.reals(1), Space.reals(1), function, new double[] {60}, NONE, new double[] {20});
    assertEquals(1, check.findings().size());
    assertFalse(check.passed());
  }

  @ParameterizedTest
  @ValueSource(ints = {0, 1, 2, 3})
  void anErrorOfAHundredThousandthIsNamedInEachEntry(int entry) {
    for (double factor : new double[] {1 + 1e-5, 1 - 1e-5}) {
      List<JacobianFinding> found = findings((u, given, jacobian) -> jacobian[entry] *= factor);
      assertEquals(1, found.size(), found::toString);
      assertEquals(entry, 2 * found.get(0).row() + found.get(0).column());
      assertWithin("relative", 1e-5, found.get(0).relativeDifference(), 1e-8, 1);
    }
  }

  /** Positions from 1e-12 to 1e12 of a metre, and scales wrong by a thousand either way. */
  @Test
  void scalesOfEverySizePassAndErrorsInThemAreNamed() {
    for (int power = -12; power <= 12; power++) {
      double unit = Math.pow(10, power);
      double[] point = {-3 / unit, 0.2 / unit};
      for (double off : new double[] {1e-3, 1, 1e3}) {
        double[] scales = {off / unit, off / unit};
        JacobianCheck check = JacobianCheck.of(
            Space.reals(2), SIGHT, sight(unit, (u, g, j) -> {}), scales, NONE, point);
        assertTrue(check.passed(), check::toString);
        Jacobian error = (u, g, jacobian) -> jacobian[3] *= 1 + 1e-5;
        check = JacobianCheck.of(Space.reals(2), SIGHT, sight(unit, error), scales, NONE, point);
        assertEquals(1, check.findings().size(), check::toString);
      }
    }
  }

  /** Inputs of very different size in one function, and scales that know nothing of it. */
  @Test
  void badlyScaledInputsPass() {
    VectorFunction range = new Offered(
        (u, given, z) -> {
          double x = u[0] - given[0];
          double y = u[1] - given[1];
          z[0] = Math.sqrt(x * x + y * y) + u[2] + 1e-9 * u[3];
        },
        Structure.UNKNOWN.withJacobian((u, given, jacobian) -> {
          double length = Math.hypot(u[0] - given[0], u[1] - given[1]);
          jacobian[0] = (u[0] - given[0]) / length;
          jacobian[1] = (u[1] - given[1]) / length;
          jacobian[2] = 1;
          jacobian[3] = 1e-9;
        }));
    double[] satellite = {-1.45e7, 2.19e7};
    double[] point = {1.2e6, 6.2e6, 3e5, 1e-4};
    for (double[] scales : new double[][] {{1e7, 1e7, 1e6, 1}, {1, 1, 1, 1}, {1e3, 1e3, 1, 1e9}}) {
      JacobianCheck check =
          JacobianCheck.of(Space.reals(4), Space.reals(1), range, scales, satellite, point);
      assertTrue(check.passed(), check::toString);
    }
  }

  /** Zeros of every order, values far from zero, and dependences too weak to be seen. */
  @Test
  void zerosAndHugeOffsetsPass() {
    VectorFunction function = new Offered(
        (u, given, z) -> {
          z[0] = u[0] * u[0] * u[0];
          z[1] = Math.cos(u[0]);
          z[2] = 1e9 + 1e-9 * u[0];
          z[3] = 7;
        },
        Structure.UNKNOWN.withJacobian((u, given, jacobian) -> {
          jacobian[0] = 3 * u[0] * u[0];
          jacobian[1] = -Math.sin(u[0]);
          jacobian[2] = 1e-9;
        }));
    JacobianCheck check = JacobianCheck.of(
        Space.reals(1),
        Space.reals(4),
        function,
        new double[] {1},
        NONE,
        new double[] {0},
        new double[] {1e-9},
        new double[] {Math.PI});
    assertTrue(check.passed(), check::toString);
    assertNames(check.toString(), "0 findings", "3 points");
  }

  /** Scales right, and wrong by the factor of a thousand that is promised to be forgiven. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-3, 1, 1e3})
  void randomFunctionsPassTogetherWithTheirHessians(double scale) {
    double[] scales = new double[6];
    Arrays.fill(scales, scale);
    for (int seed = 0; seed < 100; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      VectorFunction bent = new EmbeddedFunction(new BentFunction(4, 3, seed), 3, 6, 5, 0, 3, 1);
      JacobianCheck check = JacobianCheck.of(
          Space.reals(6),
          Space.reals(3),
          bent,
          scales,
          new double[1],
          random.vector(6),
          new double[6],
          random.vector(6));
      assertTrue(check.passed(), check::toString);
    }
  }

  /** Entries of size 1e-4 to 3 beside values and slopes of about 1. */
  @Test
  void anErrorOfAHundredThousandthIsNamedInRandomFunctions() {
    for (int seed = 0; seed < 200; seed++) {
      BentFunction bent = new BentFunction(3, 2, seed);
      int entry = seed % 6;
      Jacobian right = bent.structure().jacobian().orElseThrow();
      Jacobian wrong = (u, given, jacobian) -> {
        right.evaluate(u, given, jacobian);
        jacobian[entry] *= 1 + 1e-5;
      };
      JacobianCheck check = JacobianCheck.of(
          Space.reals(3),
          Space.reals(2),
          new Offered(bent, Structure.UNKNOWN.withJacobian(wrong)),
          new double[] {1, 1, 1},
          new double[1],
          new RandomGaussians(seed).vector(3));
      assertEquals(1, check.findings().size(), check::toString);
      assertEquals(
          entry, 3 * check.findings().get(0).row() + check.findings().get(0).column());
    }
  }

  @Test
  void aWrongHessianIsNamed() {
    PolarToCartesian polar = new PolarToCartesian();
    Hessian right = polar.structure().hessian().orElseThrow();
    VectorFunction wrong =
        new Offered(polar, polar.structure().withHessian((u, given, hessians) -> {
          right.evaluate(u, given, hessians);
          hessians[6] *= -1;
        }));
    JacobianCheck check = JacobianCheck.of(
        Space.reals(2), Space.reals(2), wrong, new double[] {1, 1}, NONE, new double[] {2, 0.5});
    assertEquals(1, check.findings().size(), check::toString);
    assertEquals(Kind.HESSIAN, check.findings().get(0).kind());
    assertNames(check.toString(), "Hessian[1][1][0]", "[2.0, 0.5]");
  }

  @Test
  void anInactiveInputThatMattersIsNamed() {
    BentFunction bent = new BentFunction(3, 2, 8);
    VectorFunction wrong = new Offered(bent, bent.structure().withActiveInputs(2, 0));
    JacobianCheck check = JacobianCheck.of(
        Space.reals(3), Space.reals(2), wrong, new double[] {1, 1, 1}, new double[1], new double[] {
          0.3, 0.2, 0.1
        });
    assertEquals(2, check.findings().size(), check::toString);
    for (JacobianFinding finding : check.findings()) {
      assertEquals(Kind.INACTIVE_INPUT, finding.kind());
      assertEquals(1, finding.column());
    }
    assertNames(check.toString(), "input 1 is declared inactive", "output 0", "output 1");
  }

  @Test
  void whatIsNotANumberIsNamed() {
    List<JacobianFinding> found = findings((u, given, jacobian) -> jacobian[1] = Double.NaN);
    assertEquals(1, found.size());
    assertEquals(1, found.get(0).column());
    VectorFunction broken = new Offered(
        (u, given, z) -> z[0] = Double.NaN, Structure.UNKNOWN.withJacobian((u, given, j) -> {}));
    JacobianCheck check = JacobianCheck.of(
        Space.reals(1), Space.reals(1), broken, new double[] {1}, NONE, new double[] {0});
    assertEquals(1, check.findings().size());
  }

  /** Near the edge of its domain only short steps are finite. */
  @Test
  void longStepsMayLeaveTheDomain() {
    VectorFunction root = new Offered(
        (u, given, z) -> z[0] = Math.sqrt(u[0]),
        Structure.UNKNOWN.withJacobian((u, given, j) -> j[0] = 0.5 / Math.sqrt(u[0])));
    JacobianCheck check = JacobianCheck.of(
        Space.reals(1), Space.reals(1), root, new double[] {1}, NONE, new double[] {1e-3});
    assertTrue(check.passed(), check::toString);
  }

  @Test
  void callsThatCannotWorkAreRefused() {
    VectorFunction plain = (u, given, z) -> z[0] = u[0];
    double[] one = {1};
    Space line = Space.reals(1);
    assertNames(refusal(() -> JacobianCheck.of(line, line, plain, one, NONE, one)), "no Jacobian");
    VectorFunction fine = new Offered(plain, Structure.UNKNOWN.withJacobian((u, g, j) -> j[0] = 1));
    assertNames(refusal(() -> JacobianCheck.of(line, line, fine, one, NONE)), "1 point", "0");
    double[] two = new double[2];
    assertNames(refusal(() -> JacobianCheck.of(line, line, fine, one, NONE, two)), "1", "2");
    assertNames(refusal(() -> JacobianCheck.of(line, line, fine, two, NONE, one)), "scales");
  }

  private static String refusal(Runnable call) {
    return assertThrows(IllegalArgumentException.class, call::run).getMessage();
  }
}

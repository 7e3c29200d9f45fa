package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** f = x'Ax + b'x + c of Gaussian vectors, against closed forms. Sums of some ten numbers to 25. */
class QuadraticFormsTest {
  static Stream<ReferenceTable.Row> forms() {
    return ReferenceTable.read("gaussian_quadratic_forms.csv").stream();
  }

  private static Gaussian input(ReferenceTable.Row row) {
    double[] mean = row.numbers("m");
    return Gaussian.of(mean, DMatrixRMaj.wrap(mean.length, mean.length, row.numbers("p")));
  }

  private static Outcome carry(String name, ReferenceTable.Row row) {
    return carry(NamedMatchings.of(name), row, new Form(row));
  }

  private static Outcome carry(
      MomentMatching matching, ReferenceTable.Row row, VectorFunction function) {
    Gaussian input = input(row);
    MatchingWorkspace work =
        matching.workspace(Space.reals(input.dimension()), Space.reals(1), function);
    return Outcome.of(work, RandomGaussians.momentsOf(input));
  }

  @ParameterizedTest
  @MethodSource("forms")
  void threeNodesAreExact(ReferenceTable.Row row) {
    for (String name : new String[] {"Gauss-Hermite 3", "Gauss-Hermite 4", "Gauss-Hermite 7"}) {
      Outcome got = carry(name, row);
      assertWithin("mean", row.number("mean"), got.mean[0], 1e-14, 25);
      double variance = got.covariance.get(0, 0);
      assertWithin("variance", row.number("variance"), variance, 1e-13, 200);
      assertVector("covariance", row.numbers("covariance"), got.cross().data, 1e-14, 25);
    }
  }

  /**
   * Exact to degree 3: the mean, and the covariance with x. At alpha = 1e-3 rounding grows
   * 2e6-fold.
   */
  @ParameterizedTest
  @MethodSource("forms")
  void pointsOnAxesGiveTheMeanAndTheCovarianceWithTheInput(ReferenceTable.Row row) {
    for (String name :
        new String[] {"cubature 3", "unscented 1 0 3-n", "unscented 1 2 0", "unscented 1e-3 2 0"}) {
      double tolerance = name.contains("1e-3") ? 1e-9 : 1e-14;
      Outcome got = carry(name, row);
      assertWithin(name, row.number("mean"), got.mean[0], tolerance, 25);
      assertVector(name, row.numbers("covariance"), got.cross().data, tolerance, 25);
    }
  }

  /** Linearisation misses exactly the term tr(AP) of the mean, and 2 tr((SP)^2) of the variance. */
  @ParameterizedTest
  @MethodSource("forms")
  void linearisationHasNoTermOfTheSecondOrder(ReferenceTable.Row row) {
    Outcome got = carry("linearisation", row);
    double[] squares = secondOrderTerms(row);
    assertWithin("mean", row.number("mean") - squares[0], got.mean[0], 1e-14, 25);
    double variance = got.covariance.get(0, 0);
    assertWithin("variance", row.number("variance") - squares[1], variance, 1e-13, 200);
    assertVector("covariance", row.numbers("covariance"), got.cross().data, 1e-14, 25);
  }

  /**
   * Exact for quadratic functions, with given Hessians and by differences over the spread: 25 roundings
   * or so. Differences at the mean: relative errors of 1e-10 from Jacobians, of 1e-7 from values.
   */
  @ParameterizedTest
  @MethodSource("forms")
  void secondOrderIsExact(ReferenceTable.Row row) {
    double[] scales = MatchingUnderTest.unitScales(input(row).dimension());
    Linearisation differences = Linearisation.secondOrder().withInputScales(scales);
    assertExact(row, carry(Linearisation.secondOrder(), row, new Form(row, true)), 1e-14);
    assertExact(row, carry(SpreadLinearisation.secondOrder(), row, new Form(row)), 1e-14);
    assertExact(row, carry(differences, row, new Form(row)), 1e-10);
    assertExact(row, carry(differences, row, new PlainFunction(new Form(row))), 1e-7);
  }

  private static void assertExact(ReferenceTable.Row row, Outcome got, double tolerance) {
    assertWithin("mean", row.number("mean"), got.mean[0], tolerance, 25);
    double variance = got.covariance.get(0, 0);
    assertWithin("variance", row.number("variance"), variance, 10 * tolerance, 200);
    assertVector("covariance", row.numbers("covariance"), got.cross().data, tolerance, 25);
  }

  /** Along axes only the diagonal of B'SB counts: the mean is exact, the variance misses the rest. */
  @ParameterizedTest
  @MethodSource("forms")
  void alongAxesTheProductsAreMissing(ReferenceTable.Row row) {
    Outcome got = carry("spread axes", row);
    assertWithin("mean", row.number("mean"), got.mean[0], 1e-14, 25);
    assertVector("covariance", row.numbers("covariance"), got.cross().data, 1e-14, 25);
    double missing = row.number("variance") - got.covariance.get(0, 0);
    assertTrue(missing > 0.05, () -> "missing: " + missing);
    assertTrue(missing < secondOrderTerms(row)[1], () -> "missing: " + missing);
  }

  /** tr(SP) and 2 tr((SP)^2), S = (A + A') / 2. */
  private static double[] secondOrderTerms(ReferenceTable.Row row) {
    Gaussian input = input(row);
    int n = input.dimension();
    double[] a = row.numbers("a");
    double[][] product = new double[n][n];
    double trace = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        for (int k = 0; k < n; k++) {
          product[i][j] += (a[i * n + k] + a[k * n + i]) / 2 * input.covariance(k, j);
        }
      }
      trace += product[i][i];
    }
    double square = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        square += product[i][j] * product[j][i];
      }
    }
    return new double[] {trace, 2 * square};
  }

  /** The quadratic form of a row. */
  private static final class Form implements VectorFunction {
    private final double[] a;
    private final double[] b;
    private final double c;
    private final boolean twice;

    Form(ReferenceTable.Row row) {
      this(row, false);
    }

    Form(ReferenceTable.Row row, boolean twice) {
      this.twice = twice;
      a = row.numbers("a");
      b = row.numbers("b");
      c = row.number("c");
    }

    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      double sum = c;
      for (int i = 0; i < b.length; i++) {
        sum += b[i] * input[i];
        for (int j = 0; j < b.length; j++) {
          sum += input[i] * a[i * b.length + j] * input[j];
        }
      }
      output[0] = sum;
    }

    @Override
    public Structure structure() {
      Structure once =
          Structure.UNKNOWN.withJacobian((input, given, jacobian) -> derive(input, jacobian));
      return twice ? once.withHessian((input, given, hessians) -> deriveTwice(hessians)) : once;
    }

    private void deriveTwice(double[] hessians) {
      for (int i = 0; i < b.length; i++) {
        for (int j = 0; j <= i; j++) {
          hessians[i * b.length + j] = a[i * b.length + j] + a[j * b.length + i];
        }
      }
    }

    private void derive(double[] input, double[] jacobian) {
      for (int i = 0; i < b.length; i++) {
        jacobian[i] = b[i];
        for (int j = 0; j < b.length; j++) {
          jacobian[i] += (a[i * b.length + j] + a[j * b.length + i]) * input[j];
        }
      }
    }
  }
}

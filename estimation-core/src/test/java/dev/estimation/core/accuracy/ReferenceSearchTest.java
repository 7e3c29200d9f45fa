package dev.estimation.core.accuracy;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.accuracy.ReferenceMoments.Evidence;
import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Reference moments against closed forms. Errors are also held against what the result says of itself. */
class ReferenceSearchTest {
  private static final ReferenceSettings SETTINGS = ReferenceSettings.standard();

  /** Not by chance: the seed is fixed; 4 standard errors, which 32 shifts exceed with 4e-4. */
  private static final double MOST_ERRORS = 4;

  static Stream<ReferenceTable.Row> polar() {
    return ReferenceTable.read("polar2d_exact.csv").stream();
  }

  static Stream<ReferenceTable.Row> spherical() {
    return ReferenceTable.read("spherical3d_exact.csv").stream();
  }

  static Stream<ReferenceTable.Row> scalars() {
    return ReferenceTable.read("gaussian_scalar_moments.csv").stream()
        .filter(row -> !isOutOfSight(row));
  }

  /** max(x, 0) whose only positive part lies 6.7 deviations out. */
  private static boolean isOutOfSight(ReferenceTable.Row row) {
    return row.text("function").equals("max(x;0)") && row.number("mean") == -2;
  }

  static Stream<ReferenceTable.Row> ranges() {
    return ReferenceTable.read("range_isotropic.csv").stream();
  }

  static Stream<ReferenceTable.Row> forms() {
    return ReferenceTable.read("gaussian_quadratic_forms.csv").stream();
  }

  private static ReferenceMoments find(VectorFunction function, Gaussian input, int outputs) {
    return new ReferenceSearch(
            SETTINGS, Space.reals(input.dimension()), Space.reals(outputs), function)
        .find(input);
  }

  /** Rounding of products of 33 and 65 nodes: 1e-12. */
  @ParameterizedTest
  @MethodSource("polar")
  void rangeAndBearing(ReferenceTable.Row row) {
    Gaussian input = Gaussian.independent(
        new double[] {row.number("r"), row.number("theta_rad")},
        new double[] {row.number("sigma_r"), row.number("sigma_theta_rad")});
    ReferenceMoments found = find(new PolarToCartesian(), input, 2);
    assertEquals(Evidence.CONVERGED_LEVELS, found.evidence());
    double[] mean = {row.number("mean_x"), row.number("mean_y")};
    double tolerance = Math.max(1e-12, 2 * found.estimatedError());
    DMatrixRMaj covariance = matrix(
        row.number("cov_xx"), row.number("cov_xy"), row.number("cov_xy"), row.number("cov_yy"));
    assertVector("mean", mean, found.moments().mean(), tolerance, row.number("r"));
    assertCovariance("covariance", covariance, found.moments().covariance(), 10 * tolerance);
    assertTrue(found.estimatedError() <= SETTINGS.accuracy());
  }

  private static DMatrixRMaj matrix(double... entries) {
    int n = (int) Math.round(Math.sqrt(entries.length));
    return DMatrixRMaj.wrap(n, n, entries);
  }

  @ParameterizedTest
  @MethodSource("spherical")
  void rangeAndTwoAngles(ReferenceTable.Row row) {
    Gaussian input = Gaussian.independent(
        new double[] {row.number("r"), row.number("az_rad"), row.number("el_rad")},
        new double[] {row.number("sigma_r"), row.number("sigma_az_rad"), row.number("sigma_el_rad")
        });
    ReferenceMoments found = find(
        (u, given, z) -> {
          z[0] = u[0] * Math.cos(u[1]) * Math.cos(u[2]);
          z[1] = u[0] * Math.sin(u[1]) * Math.cos(u[2]);
          z[2] = u[0] * Math.sin(u[2]);
        },
        input,
        3);
    assertEquals(Evidence.CONVERGED_LEVELS, found.evidence());
    double[] mean = {row.number("mean_x"), row.number("mean_y"), row.number("mean_z")};
    DMatrixRMaj covariance = matrix(
        row.number("cxx"),
        row.number("cxy"),
        row.number("cxz"),
        row.number("cxy"),
        row.number("cyy"),
        row.number("cyz"),
        row.number("cxz"),
        row.number("cyz"),
        row.number("czz"));
    double tolerance = Math.max(1e-12, 2 * found.estimatedError());
    assertVector("mean", mean, found.moments().mean(), tolerance, row.number("r"));
    assertCovariance("covariance", covariance, found.moments().covariance(), 10 * tolerance);
  }

  /** Smooth functions converge; |x| and max(x, 0) do unless their kink is 6 deviations away. */
  @ParameterizedTest
  @MethodSource("scalars")
  void scalarFunctions(ReferenceTable.Row row) {
    double deviation = row.number("deviation");
    Gaussian input =
        Gaussian.independent(new double[] {row.number("mean")}, new double[] {deviation});
    String name = row.text("function");
    ReferenceMoments found = find(Scalars.named(name), input, 1);
    boolean bentNear = (name.equals("|x|") || name.startsWith("max")) && row.number("mean") > -2;
    if (bentNear) {
      assertEquals(Evidence.SHIFTED_POINTS, found.evidence());
    }
    if (!name.equals("|x|") && !name.startsWith("max")) {
      assertEquals(Evidence.CONVERGED_LEVELS, found.evidence());
    }
    double rounding = 1e-11;
    double spread = Math.sqrt(row.number("variance_f"));
    double meanError = MOST_ERRORS * found.meanError(0) + rounding * spread;
    assertWithin("mean", row.number("mean_f"), found.moments().mean()[0], 1, meanError);
    double varianceError =
        MOST_ERRORS * found.covarianceError(0, 0) + rounding * row.number("variance_f");
    assertWithin(
        "variance",
        row.number("variance_f"),
        found.moments().covariance().get(0, 0),
        1,
        varianceError);
    double crossError = MOST_ERRORS * deviation * found.unitCrossCovarianceError(0, 0)
        + rounding * spread * deviation;
    assertWithin(
        "cross-covariance",
        row.number("covariance"),
        found.moments().crossCovariance().get(0, 0),
        1,
        crossError);
  }

  /** What no node of three levels meets is not there: the limit that the javadoc states. */
  @Test
  void aFeatureBeyondAllNodesIsMissed() {
    Gaussian input = Gaussian.independent(new double[] {-2}, new double[] {0.3});
    ReferenceMoments found = find(Scalars.named("max(x;0)"), input, 1);
    assertEquals(0, found.moments().mean()[0]);
  }

  /** A range within three deviations of its origin has no converging levels; at five it has. */
  @ParameterizedTest
  @MethodSource("ranges")
  void rangeNearTheOrigin(ReferenceTable.Row row) {
    double sigma = row.number("sigma");
    Gaussian input =
        Gaussian.independent(new double[] {row.number("nu"), 0}, new double[] {sigma, sigma});
    ReferenceMoments found = find((u, given, z) -> z[0] = Math.hypot(u[0], u[1]), input, 1);
    boolean near = row.number("nu") < 4 * sigma;
    assertEquals(near ? Evidence.SHIFTED_POINTS : Evidence.CONVERGED_LEVELS, found.evidence());
    assertTrue(found.evaluations() > (near ? 100_000 : 100), found.toString());
    assertWithin(
        "mean",
        row.number("mean_range"),
        found.moments().mean()[0],
        MOST_ERRORS,
        found.meanError(0));
    assertWithin(
        "variance",
        row.number("variance_range"),
        found.moments().covariance().get(0, 0),
        MOST_ERRORS,
        found.covarianceError(0, 0));
    assertTrue(found.estimatedError() < 2e-3, found.toString());
  }

  /** P_uz in natural order, also where the function reads inputs in another, or a part. */
  @ParameterizedTest
  @MethodSource("forms")
  void quadraticForms(ReferenceTable.Row row) {
    double[] mean = row.numbers("m");
    int n = mean.length;
    Gaussian input = Gaussian.of(mean, DMatrixRMaj.wrap(n, n, row.numbers("p")));
    int[] backwards = new int[n];
    for (int i = 0; i < n; i++) {
      backwards[i] = n - 1 - i;
    }
    VectorFunction form = new QuadraticForm(row, Structure.UNKNOWN.withActiveInputs(backwards));
    ReferenceMoments found = find(form, input, 1);
    assertEquals(Evidence.CONVERGED_LEVELS, found.evidence());
    assertWithin("mean", row.number("mean"), found.moments().mean()[0], 1e-13, 25);
    double variance = found.moments().covariance().get(0, 0);
    assertWithin("variance", row.number("variance"), variance, 1e-12, 200);
    double[] cross = found.moments().crossCovariance().data;
    assertVector("cross-covariance", row.numbers("covariance"), cross, 1e-13, 25);
    DMatrixRMaj w = found.moments().unitCrossCovariance();
    double explained = 0;
    for (int i = 0; i < n; i++) {
      explained += w.get(i, 0) * w.get(i, 0);
    }
    double unexplained = found.moments().unexplained().get(0, 0);
    assertWithin("U", variance - explained, unexplained, 1e-12, 200);
    double share = unexplained / variance;
    assertWithin("share", share, found.moments().unexplainedShare(), 1e-12, 1);
    assertWithin("worst share", share, found.moments().worstUnexplainedShare(), 1e-12, 1);
  }

  /** Six inputs take sparse grids: exp(b'x) has mean exp(b'Pb / 2), at b'Pb = 0.15. */
  @Test
  void sparseGridsForManyInputs() {
    Gaussian input = Gaussian.of(new double[6], new RandomGaussians(3).covariance(6));
    VectorFunction function = (u, given, z) -> {
      double sum = 0;
      for (double value : u) {
        sum += value;
      }
      z[0] = Math.exp(given[0] * sum);
    };
    double variance = 0;
    for (double value : input.covariance().data) {
      variance += value;
    }
    double b = Math.sqrt(0.15 / variance);
    ReferenceSearch search =
        new ReferenceSearch(SETTINGS.withAccuracy(1e-4), Space.reals(6), Space.reals(1), function);
    ReferenceMoments found = search.find(input, b);
    assertEquals(Evidence.CONVERGED_LEVELS, found.evidence());
    double wanted = Math.exp(0.15 / 2);
    double deviation = wanted * Math.sqrt(Math.expm1(0.15));
    double got = found.moments().mean()[0];
    assertWithin("mean", wanted, got, found.estimatedError(), deviation);
    assertWithin(
        "variance",
        deviation * deviation,
        found.moments().covariance().get(0, 0),
        found.estimatedError(),
        deviation * deviation);
  }

  /** A zero variance and an affine function: exact, nothing left, and W without its row. */
  @Test
  void affineFunctionOfASingularInput() {
    Gaussian input = Gaussian.of(new double[] {1, 2}, new double[][] {{0, 0}, {0, 4}});
    ReferenceMoments found = find((u, given, z) -> z[0] = 3 * u[0] - 0.5 * u[1] + 1, input, 1);
    assertEquals(Evidence.CONVERGED_LEVELS, found.evidence());
    assertWithin("mean", 3, found.moments().mean()[0], 1e-14, 3);
    assertWithin("variance", 1, found.moments().covariance().get(0, 0), 1e-14, 1);
    assertVector("W", new double[] {0, -1}, found.moments().unitCrossCovariance().data, 1e-14, 1);
    assertWithin("share", 0, found.moments().unexplainedShare(), 1e-14, 1);
  }

  /** A turn about one axis by a Gaussian angle, seen as an angle across the seam. */
  @Test
  void anglesAcrossTheSeam() {
    Gaussian input = Gaussian.independent(new double[] {Math.PI}, new double[] {0.2});
    ReferenceMoments found = new ReferenceSearch(
            SETTINGS, Space.reals(1), Space.angles(1), (u, given, z) -> z[0] = u[0] + 0.5)
        .find(input);
    assertWithin("mean", 0.5 - Math.PI, found.moments().mean()[0], 1e-13, 1);
    assertWithin("variance", 0.04, found.moments().covariance().get(0, 0), 1e-13, 0.04);
  }

  /** Rotations handed through keep mean and covariance. Rounding of logarithms: 1e-10. */
  @Test
  void rotationsKeepTheirMoments() {
    double[] mean = {0.5, 0.5, -0.5, 0.5};
    DMatrixRMaj covariance = new RandomGaussians(2).covariance(3);
    for (int i = 0; i < 9; i++) {
      covariance.data[i] *= 0.01;
    }
    Gaussian input = Gaussian.of(Space.unitQuaternion(), mean, covariance);
    ReferenceMoments found = new ReferenceSearch(
            SETTINGS,
            Space.unitQuaternion(),
            Space.unitQuaternion(),
            (u, given, z) -> System.arraycopy(u, 0, z, 0, 4))
        .find(input);
    assertEquals(Evidence.CONVERGED_LEVELS, found.evidence());
    assertVector("mean", mean, found.moments().mean(), 1e-10, 1);
    assertCovariance("covariance", covariance, found.moments().covariance(), 1e-10);
    assertCovariance("cross", covariance, found.moments().crossCovariance(), 1e-10);
  }

  @Test
  void notANumberIsToldWithItsPlace() {
    Gaussian input = Gaussian.independent(new double[] {1}, new double[] {1});
    IllegalArgumentException thrown = assertThrows(
        IllegalArgumentException.class,
        () -> find((u, given, z) -> z[0] = Math.sqrt(u[0]), input, 1));
    assertNames(thrown.getMessage(), "finite", "NaN", "reference moments");
  }

  @Test
  void settingsAreChecked() {
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> SETTINGS.withAccuracy(Double.NaN))
            .getMessage(),
        "accuracy",
        "NaN");
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> SETTINGS.withPoints(255, 15, 1))
            .getMessage(),
        "16",
        "15");
  }
}

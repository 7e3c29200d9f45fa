package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.largest;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * A measurement turned to a position: the inverse of the measurement function, carried by a matching. The conversions of
 * the literature are closed forms of it, and follow from the same operation. With s the deviation of the
 * bearing and l = exp(-s^2 / 2):
 *
 * <ul>
 *   <li>modified unbiased (Duan, Han and Li 2004): mean l r (cos, sin) and the exact covariance at the
 *       measurement, which is what a matching gives;
 *   <li>truth-conditioned (Lerro and Bar-Shalom 1993): bias and covariance of the plain conversion at the true position;
 *   <li>averaged (same): the mean of both over the true position, given the measurement;
 *   <li>unbiased (Mo and others 1998): the plain conversion divided by l.
 * </ul>
 *
 * <p>Thirty nodes an axis are exact to rounding for deviations up to 1 rad. Covariances are differences of squares up to
 * 1e10 that leave 1e6, so 1e-11 of the largest entry; formulas from memory, as the table says.
 */
class ConvertedMeasurementTest {
  private static final double TOLERANCE = 1e-11;
  private static final Space POLAR = Space.reals(1).and(Space.angles(1));

  static Stream<ReferenceTable.Row> cases() {
    return ReferenceTable.read("polar2d_debiased.csv").stream();
  }

  static Stream<ReferenceTable.Row> sphericalCases() {
    return ReferenceTable.read("spherical3d_exact.csv").stream();
  }

  private static Gaussian measurement(ReferenceTable.Row row) {
    return Gaussian.independent(
        POLAR,
        new double[] {row.number("r_m"), row.number("theta_m_rad")},
        new double[] {row.number("sigma_r"), row.number("sigma_theta_rad")});
  }

  private static Outcome carry(Space input, Gaussian value, int outputs, VectorFunction function) {
    Moments moments = new Moments(input);
    moments.set(value);
    return Outcome.of(
        NamedMatchings.product(30).workspace(input, Space.reals(outputs), function), moments);
  }

  private static double[] plain(ReferenceTable.Row row) {
    double r = row.number("r_m");
    double theta = row.number("theta_m_rad");
    return new double[] {r * Math.cos(theta), r * Math.sin(theta)};
  }

  private static double shrink(ReferenceTable.Row row) {
    double s = row.number("sigma_theta_rad");
    return Math.exp(-s * s / 2);
  }

  private static DMatrixRMaj covariance(ReferenceTable.Row row, String name) {
    double xy = row.number(name + "12");
    return new DMatrixRMaj(new double[][] {
      {row.number(name + "11"), xy}, {xy, row.number(name + "22")}
    });
  }

  private static void assertClose(DMatrixRMaj expected, DMatrixRMaj actual) {
    assertMatrix("covariance", expected, actual, TOLERANCE, largest(expected.data));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void theMatchingIsTheModifiedUnbiasedConversion(ReferenceTable.Row row) {
    Outcome got = carry(POLAR, measurement(row), 2, new PolarToCartesian());
    double[] plain = plain(row);
    double l = shrink(row);
    double[] mean = {l * plain[0], l * plain[1]};
    assertVector("mean", mean, got.mean, 1e-13, largest(mean));
    assertClose(covariance(row, "Rt"), got.covariance);
  }

  /** Measurements scattered about a true position: the mean of the plain conversion is off by mu_t. */
  @ParameterizedTest
  @MethodSource("cases")
  void thePlainConversionIsBiasedAtTheTruth(ReferenceTable.Row row) {
    Outcome got = carry(POLAR, measurement(row), 2, new PolarToCartesian());
    double[] truth = plain(row);
    double[] bias = {got.mean[0] - truth[0], got.mean[1] - truth[1]};
    double[] wanted = {row.number("mu_t_x"), row.number("mu_t_y")};
    // A difference of positions: some roundings of these.
    assertVector("bias", wanted, bias, 1e-14, largest(truth));
  }

  /** The mean of bias and covariance over true positions r_m - w_r, theta_m - w_theta. */
  @ParameterizedTest
  @MethodSource("cases")
  void averagedOverTheTruthItIsTheDebiasedConversion(ReferenceTable.Row row) {
    Gaussian measured = measurement(row);
    double rangeVariance = measured.covariance(0, 0);
    double s2 = measured.covariance(1, 1);
    VectorFunction conditioned = (truth, given, output) -> {
      double l = Math.exp(-s2 / 2);
      double x = truth[0] * Math.cos(truth[1]);
      double y = truth[0] * Math.sin(truth[1]);
      double half = (truth[0] * truth[0] + rangeVariance) / 2;
      double turned = Math.exp(-2 * s2);
      output[0] = (l - 1) * x;
      output[1] = (l - 1) * y;
      output[2] = half * (1 + turned * Math.cos(2 * truth[1])) - l * x * l * x;
      output[3] = half * turned * Math.sin(2 * truth[1]) - l * x * l * y;
      output[4] = half * (1 - turned * Math.cos(2 * truth[1])) - l * y * l * y;
    };
    double[] got = carry(POLAR, measured, 5, conditioned).mean;
    double[] wanted = {row.number("mu_a_x"), row.number("mu_a_y")};
    assertVector("bias", wanted, new double[] {got[0], got[1]}, 1e-12, largest(wanted));
    assertClose(covariance(row, "Ra"), new DMatrixRMaj(new double[][] {
      {got[2], got[3]}, {got[3], got[4]}
    }));
  }

  /** Divided by l, the plain conversion is on average the truth. */
  @ParameterizedTest
  @MethodSource("cases")
  void theUnbiasedConversionHasNoBias(ReferenceTable.Row row) {
    double l = shrink(row);
    VectorFunction unbiased = (z, given, x) -> {
      x[0] = z[0] * Math.cos(z[1]) / l;
      x[1] = z[0] * Math.sin(z[1]) / l;
    };
    double[] truth = plain(row);
    double[] mean = carry(POLAR, measurement(row), 2, unbiased).mean;
    assertVector("mean", truth, mean, 1e-13, largest(truth));
  }

  /** Its covariance given the measurement is the second moment of the exact position about it. */
  @ParameterizedTest
  @MethodSource("cases")
  void theUnbiasedConversionAddsItsDistanceFromTheMean(ReferenceTable.Row row) {
    double l = shrink(row);
    double[] plain = plain(row);
    Outcome exact = carry(POLAR, measurement(row), 2, new PolarToCartesian());
    double half = (square(row.number("r_m")) + square(row.number("sigma_r"))) / 2;
    double theta = row.number("theta_m_rad");
    double turned = Math.pow(l, 4);
    double factor = 1 / (l * l) - 2;
    double[][] wanted = {
      {
        factor * plain[0] * plain[0] + half * (1 + turned * Math.cos(2 * theta)),
        factor * plain[0] * plain[1] + half * turned * Math.sin(2 * theta)
      },
      {
        factor * plain[0] * plain[1] + half * turned * Math.sin(2 * theta),
        factor * plain[1] * plain[1] + half * (1 - turned * Math.cos(2 * theta))
      }
    };
    DMatrixRMaj got = exact.covariance.copy();
    for (int i = 0; i < 2; i++) {
      for (int j = 0; j < 2; j++) {
        got.add(i, j, (exact.mean[i] - plain[i] / l) * (exact.mean[j] - plain[j] / l));
      }
    }
    assertClose(new DMatrixRMaj(wanted), got);
  }

  private static double square(double value) {
    return value * value;
  }

  /** Range, azimuth and elevation to a position in space. */
  @ParameterizedTest
  @MethodSource("sphericalCases")
  void rangeAzimuthAndElevationGiveAPosition(ReferenceTable.Row row) {
    Space sight = Space.reals(1).and(Space.angles(2));
    Gaussian measured = Gaussian.independent(
        sight,
        new double[] {row.number("r"), row.number("az_rad"), row.number("el_rad")},
        new double[] {row.number("sigma_r"), row.number("sigma_az_rad"), row.number("sigma_el_rad")
        });
    Outcome got = carry(sight, measured, 3, (z, given, x) -> {
      x[0] = z[0] * Math.cos(z[2]) * Math.cos(z[1]);
      x[1] = z[0] * Math.cos(z[2]) * Math.sin(z[1]);
      x[2] = z[0] * Math.sin(z[2]);
    });
    double[] mean = {row.number("mean_x"), row.number("mean_y"), row.number("mean_z")};
    assertVector("mean", mean, got.mean, 1e-13, largest(mean));
    double xy = row.number("cxy");
    double xz = row.number("cxz");
    double yz = row.number("cyz");
    assertClose(
        new DMatrixRMaj(new double[][] {
          {row.number("cxx"), xy, xz}, {xy, row.number("cyy"), yz}, {xz, yz, row.number("czz")}
        }),
        got.covariance);
  }
}

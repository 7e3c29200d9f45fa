package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Whitening;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Moments to a tolerance against closed forms (their sources stand in the tables): errors of mean and covariance in
 * standard deviations of the exact output are within it, at 0.1, 0.01 and 0.001.
 */
class ToleranceTruthTest {
  private static final double[] TOLERANCES = {0.1, 0.01, 0.001};

  static Stream<ReferenceTable.Row> polar() {
    return ReferenceTable.read("polar2d_exact.csv").stream();
  }

  static Stream<ReferenceTable.Row> spherical() {
    return ReferenceTable.read("spherical3d_exact.csv").stream();
  }

  static Stream<ReferenceTable.Row> range() {
    return ReferenceTable.read("range_isotropic.csv").stream();
  }

  @ParameterizedTest
  @MethodSource
  void polar(ReferenceTable.Row row) {
    Gaussian input = Gaussian.independent(
        numbers(row, "r", "theta_rad"), numbers(row, "sigma_r", "sigma_theta_rad"));
    double[] mean = numbers(row, "mean_x", "mean_y");
    DMatrixRMaj covariance = symmetric(2, numbers(row, "cov_xx", "cov_xy", "cov_yy"));
    check(input, new PolarToCartesian(), mean, covariance);
  }

  @ParameterizedTest
  @MethodSource
  void spherical(ReferenceTable.Row row) {
    Gaussian input = Gaussian.independent(
        numbers(row, "r", "az_rad", "el_rad"),
        numbers(row, "sigma_r", "sigma_az_rad", "sigma_el_rad"));
    VectorFunction spherical = (u, given, z) -> {
      z[0] = u[0] * Math.cos(u[1]) * Math.cos(u[2]);
      z[1] = u[0] * Math.sin(u[1]) * Math.cos(u[2]);
      z[2] = u[0] * Math.sin(u[2]);
    };
    DMatrixRMaj covariance = symmetric(3, numbers(row, "cxx", "cxy", "cxz", "cyy", "cyz", "czz"));
    check(input, spherical, numbers(row, "mean_x", "mean_y", "mean_z"), covariance);
  }

  /**
   * Where the spread reaches the origin a range is not smooth: the status says so, but at 0.1, which can be met. From a spread of a
   * quarter on, what is promised in 99 % of cases is not promised in each: a tenth more is allowed there.
   */
  @ParameterizedTest
  @MethodSource
  void range(ReferenceTable.Row row) {
    double sigma = row.number("sigma");
    Gaussian input =
        Gaussian.independent(new double[] {row.number("nu"), 0}, new double[] {sigma, sigma});
    boolean smooth = 4 * sigma < row.number("nu");
    DMatrixRMaj variance = symmetric(1, row.number("variance_range"));
    for (double tolerance : TOLERANCES) {
      MatchingWorkspace work = ToleranceMatching.within(tolerance)
          .workspace(Space.reals(2), Space.reals(1), (u, no, z) -> z[0] = Math.hypot(u[0], u[1]));
      MatchingStatus status = work.carry(moments(input), new double[0], null);
      if (status == MatchingStatus.MATCHED) {
        double error = error(work, new double[] {row.number("mean_range")}, variance);
        double allowed = smooth ? tolerance : 1.1 * tolerance;
        assertTrue(error <= allowed, "error " + error + " at " + tolerance);
      }
      assertTrue(!smooth || status == MatchingStatus.MATCHED, work.failure());
      boolean atOrigin = row.number("nu") < 2 * sigma && tolerance < 0.1;
      assertTrue(!atOrigin || status == MatchingStatus.BELOW_TOLERANCE, () -> "" + status);
    }
  }

  private static void check(
      Gaussian input, VectorFunction function, double[] mean, DMatrixRMaj covariance) {
    int n = mean.length;
    for (double tolerance : TOLERANCES) {
      MatchingWorkspace work =
          ToleranceMatching.within(tolerance).workspace(Space.reals(n), Space.reals(n), function);
      assertEquals(MatchingStatus.MATCHED, work.carry(moments(input), new double[0], null));
      double error = error(work, mean, covariance);
      assertTrue(error <= tolerance, "error " + error + " at " + tolerance);
    }
  }

  /** The larger of the errors of mean and covariance under the exact covariance. */
  private static double error(MatchingWorkspace work, double[] mean, DMatrixRMaj covariance) {
    Whitening exact = new Whitening(covariance);
    double[] shift = work.mean().clone();
    for (int i = 0; i < shift.length; i++) {
      shift[i] -= mean[i];
    }
    DMatrixRMaj change = work.output().covariance().copy();
    CommonOps_DDRM.subtractEquals(change, covariance);
    return Math.max(exact.length(shift), Whitening.largest(exact.eigenvalues(change)));
  }

  private static Moments moments(Gaussian input) {
    Moments moments = new Moments(Space.reals(input.dimension()));
    moments.set(input);
    return moments;
  }

  private static double[] numbers(ReferenceTable.Row row, String... columns) {
    return Stream.of(columns).mapToDouble(row::number).toArray();
  }

  /** From an upper triangle, row by row. */
  private static DMatrixRMaj symmetric(int size, double... upper) {
    DMatrixRMaj result = new DMatrixRMaj(size, size);
    int at = 0;
    for (int i = 0; i < size; i++) {
      for (int j = i; j < size; j++) {
        result.set(i, j, upper[at]);
        result.set(j, i, upper[at++]);
      }
    }
    return result;
  }
}

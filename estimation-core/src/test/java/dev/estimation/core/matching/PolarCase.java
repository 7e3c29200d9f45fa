package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.largest;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.ReferenceTable;

/** A case of polar2d_exact.csv: an independent range and angle, to be turned to x and y. */
final class PolarCase {
  private final ReferenceTable.Row row;

  private PolarCase(ReferenceTable.Row row) {
    this.row = row;
  }

  static PolarCase named(String name) {
    return new PolarCase(ReferenceTable.read("polar2d_exact.csv").rowWhere("case", name));
  }

  Gaussian polar() {
    return Gaussian.independent(
        new double[] {row.number("r"), row.number("theta_rad")},
        new double[] {row.number("sigma_r"), row.number("sigma_theta_rad")});
  }

  Outcome carry(MomentMatching matching) {
    MatchingWorkspace work =
        matching.workspace(Space.reals(2), Space.reals(2), new PolarToCartesian());
    return Outcome.of(work, RandomGaussians.momentsOf(polar()));
  }

  /** The exact values of this case. */
  ReferenceTable.Row exact() {
    return row;
  }

  /** Compares with the mean and covariance of a row, each relative to its largest entry. */
  static void assertMoments(ReferenceTable.Row wanted, Outcome got, double tolerance) {
    double[] mean = {wanted.number("mean_x"), wanted.number("mean_y")};
    assertVector("mean", mean, got.mean, tolerance, largest(mean));
    double[] covariance = {
      wanted.number("cov_xx"),
      wanted.number("cov_xy"),
      wanted.number("cov_xy"),
      wanted.number("cov_yy"),
    };
    assertVector("covariance", covariance, got.covariance.data, tolerance, largest(covariance));
  }
}

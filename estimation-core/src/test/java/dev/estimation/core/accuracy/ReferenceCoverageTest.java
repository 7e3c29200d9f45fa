package dev.estimation.core.accuracy;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.accuracy.ReferenceMoments.Evidence;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.ReferenceTable;
import org.apache.commons.math3.distribution.TDistribution;
import org.junit.jupiter.api.Test;

/**
 * How often +-2 errors of reference moments by shifted points hold the exact value: a range at its origin,
 * 300 seeds, 32 shifts of 255 points. Normal shifts would give Student's 94.6 %; the share must lie within 4
 * deviations by chance of it (5.2 %), less 3 % below, since few points in the tails decide. Chance alone gives a
 * false alarm of 6e-5 for each of the 3 checks.
 */
class ReferenceCoverageTest {
  private static final int RUNS = 300;

  @Test
  void errorsAtTheOriginAreHonest() {
    ReferenceTable.Row row = ReferenceTable.read("range_isotropic.csv").rowWhere("nu", "0.0");
    VectorFunction range = (u, given, z) -> z[0] = Math.hypot(u[0], u[1]);
    double sigma = row.number("sigma");
    Gaussian input =
        Gaussian.independent(new double[] {row.number("nu"), 0}, new double[] {sigma, sigma});
    int[] held = new int[3];
    for (int seed = 1; seed <= RUNS; seed++) {
      ReferenceMoments found = new ReferenceSearch(
              ReferenceSettings.standard().withPoints(255, 32, seed),
              Space.reals(2),
              Space.reals(1),
              range)
          .find(input);
      assertEquals(Evidence.SHIFTED_POINTS, found.evidence());
      CarriedMoments moments = found.moments();
      held[0] += holds(moments.mean()[0] - row.number("mean_range"), found.meanError(0));
      held[1] += holds(
          moments.covariance().get(0, 0) - row.number("variance_range"),
          found.covarianceError(0, 0));
      // Symmetry: the range does not follow the second input.
      held[2] +=
          holds(moments.unitCrossCovariance().get(1, 0), found.unitCrossCovarianceError(1, 0));
    }
    double student = 1 - 2 * new TDistribution(null, 31).cumulativeProbability(-2);
    double chance = 4 * Math.sqrt(student * (1 - student) / RUNS);
    for (int i = 0; i < held.length; i++) {
      double share = held[i] / (double) RUNS;
      String what = "result " + i + ": " + share + " of " + student;
      assertTrue(share >= student - chance - 0.03, what);
      assertTrue(share <= student + chance, what);
    }
  }

  private static int holds(double error, double standardError) {
    return Math.abs(error) <= 2 * standardError ? 1 : 0;
  }
}

package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertRelative;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.ReferenceTable;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The local level model on the annual flow of the Nile, with every matching. 4e-12: the first
 * update takes a variance of 1e7 down to 15076, which multiplies its few roundings by 663; the values
 * are printed to 17 digits.
 */
class NileTest extends BothForms {
  private static final double TOLERANCE = 4e-12;

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void vaguePrior(MomentMatching matching) {
    ReferenceTable table = ReferenceTable.read("nile_kalman_P1e7.csv");
    double logLikelihood = follow(matching, table, 0, 1e7, "y");
    assertRelative("log-likelihood", -641.5855784594153, logLikelihood, TOLERANCE);
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void missingYears(MomentMatching matching) {
    ReferenceTable table = ReferenceTable.read("nile_kalman_missing_P1e7.csv");
    double logLikelihood = follow(matching, table, 0, 1e7, "y_used");
    assertRelative("log-likelihood", -389.6269775255986, logLikelihood, TOLERANCE);
  }

  /** The exact diffuse filter is at (y_1, R) after the first year. */
  @ParameterizedTest
  @MethodSource("matchings")
  void diffusePrior(MomentMatching matching) {
    ReferenceTable table = ReferenceTable.read("nile_kalman_diffuse.csv");
    FilterPlan plan = plan(matching);
    Estimate level = plan.start(1871, Gaussian.of(new double[] {1120}, new double[][] {{15099}}));
    double logLikelihood = follow(plan, level, table.rows().subList(1, 100), "y");
    assertRelative("log-likelihood", -632.5456251156737, logLikelihood, TOLERANCE);
  }

  private FilterPlan plan(MomentMatching matching) {
    return formed(FilterPlan.of(new PlainWalk(1, 1469.1), matching));
  }

  private double follow(
      MomentMatching matching, ReferenceTable table, double mean, double variance, String column) {
    FilterPlan plan = plan(matching);
    Gaussian prior = Gaussian.of(new double[] {mean}, new double[][] {{variance}});
    return follow(plan, plan.start(1871, prior), table.rows(), column);
  }

  private static double follow(
      FilterPlan plan, Estimate level, List<ReferenceTable.Row> rows, String column) {
    FilterWorkspace work = plan.workspace();
    SensorPort gauge = work.port(new PlainPosition(1, 15099));
    double logLikelihood = 0;
    for (ReferenceTable.Row row : rows) {
      String year = row.text("year");
      assertEquals(StepStatus.APPLIED, work.predict(level, row.number("year")));
      assertRelative(year, row.number("pred_mean"), level.mean(0), TOLERANCE);
      assertRelative(year, row.number("pred_var"), level.covariance(0, 0), TOLERANCE);
      if (!row.text(column).isEmpty()) {
        double[] flow = {row.number(column)};
        assertEquals(StepStatus.APPLIED, gauge.update(level, flow));
        logLikelihood += gauge.logLikelihood();
      }
      assertRelative(year, row.number("filt_mean"), level.mean(0), TOLERANCE);
      assertRelative(year, row.number("filt_var"), level.covariance(0, 0), TOLERANCE);
    }
    return logLikelihood;
  }
}

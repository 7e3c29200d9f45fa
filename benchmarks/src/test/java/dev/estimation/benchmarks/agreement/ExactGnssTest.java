package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import dev.estimation.benchmarks.cases.gnss.GnssCase;
import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.filters.filter.IteratedUpdate;
import dev.estimation.testing.ReferenceTable;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * A receiver that starts 100 km off, held against values of 50 digits: variances of 1e10 m^2 meet noise
 * of 1 m^2. Limits: 1e-7 standard deviations, where a pseudorange of 2.2e7 m is rounded at 1e-8 of its
 * standard deviation, and ten times that for the smoother, which goes back over all of them.
 */
class ExactGnssTest {
  private static final String LOG = "gnss-nya1-2024124";

  @Test
  void firstOrder() {
    check("linear", filtered(FilterKind.of(Linearisation.firstOrder())), 1e-7);
  }

  @Test
  void iterated() {
    check("linear-iterated", filtered(FilterKind.iterated(IteratedUpdate.undamped())), 1e-7);
  }

  @Test
  void smoothed() {
    assumeTrue(ReferenceFiles.exist(), "no reference folder: not compared");
    Replayer replayer = new Replayer(scenario(), FilterKind.of(Linearisation.firstOrder()));
    check("linear-smoothed", replayer.runAndSmooth().smoothed(), 1e-6);
  }

  private static RunResult filtered(FilterKind kind) {
    assumeTrue(ReferenceFiles.exist(), "no reference folder: not compared");
    return new Replayer(scenario(), kind).run();
  }

  private static Scenario scenario() {
    return new GnssCase(ReferenceFiles.log(LOG)).load("far").scenario().orElseThrow();
  }

  private static void check(String filter, RunResult result, double limit) {
    List<ReferenceTable.Row> rows =
        ReferenceTable.read("gnss_exact.csv").rowsWhere("filter", filter);
    EstimateDistance distance = new EstimateDistance();
    for (ReferenceTable.Row row : rows) {
      distance.add(
          result.history().get(row.count("step")).estimate(), mean(row), upperTriangle(row));
    }
    assertTrue(
        distance.largest() <= limit,
        filter + ": distance must be at most " + limit + ", got " + distance.largest());
    if (result.innovations().isPresent()) {
      double exact = rows.get(0).number("log_likelihood");
      // 1e-9 relative: 720 sums of terms to 1e4.
      assertEquals(exact, result.innovations().get().logLikelihood(), 1e-9 * Math.abs(exact));
    }
  }

  private static double[] mean(ReferenceTable.Row row) {
    double[] mean = new double[5];
    for (int i = 0; i < 5; i++) {
      mean[i] = row.number("m" + i);
    }
    return mean;
  }

  private static double[] upperTriangle(ReferenceTable.Row row) {
    List<Double> entries = new ArrayList<>();
    for (int i = 0; i < 5; i++) {
      for (int j = i; j < 5; j++) {
        entries.add(row.number("p" + i + j));
      }
    }
    return entries.stream().mapToDouble(Double::doubleValue).toArray();
  }
}

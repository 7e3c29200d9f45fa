package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import dev.estimation.benchmarks.cases.gnss.GnssCase;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.weigh.Contender;
import dev.estimation.benchmarks.weigh.FunctionWeight;
import dev.estimation.benchmarks.weigh.MethodWeight;
import dev.estimation.benchmarks.weigh.Recommendation;
import dev.estimation.benchmarks.weigh.Region;
import dev.estimation.benchmarks.weigh.ScenarioChange;
import dev.estimation.benchmarks.weigh.Selection;
import dev.estimation.benchmarks.weigh.WeighedRun;
import dev.estimation.benchmarks.weigh.Weighing;
import dev.estimation.benchmarks.weigh.Wish;
import dev.estimation.benchmarks.weigh.Workers;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.ToleranceMatching;
import dev.estimation.core.points.GaussHermiteRule;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/**
 * On a log of a receiver at rest that starts 100 km off, linearisation suffices once the place is known, and not before.
 * Measured at the first epoch: an error above 1, hundred times the tolerance; from the 50th on: below 1e-6.
 */
class WeighLogTest {
  private static final double TOLERANCE = 0.01;
  private static final List<Contender> METHODS = List.of(
      new Contender("linear", Linearisation.firstOrder()),
      new Contender("hermite:5", PointMatching.of(GaussHermiteRule.product(5))));

  private static WeighedRun weigh(Selection selection, int rows) {
    assumeTrue(ReferenceFiles.exist(), "no reference logs");
    Scenario scenario = new GnssCase(ReferenceFiles.log("gnss-nya1-2024124"))
        .load("far")
        .scenario()
        .orElseThrow();
    Region region = Region.along(new ScenarioChange(1, rows, 0).of(scenario), selection);
    return new Weighing(region, ToleranceMatching.within(0.001), METHODS, TOLERANCE)
        .run(new Workers(2), false, () -> {});
  }

  private static Optional<String> recommended(WeighedRun run) {
    return Recommendation.of(run, new Wish(TOLERANCE, false, Double.POSITIVE_INFINITY))
        .method();
  }

  @Test
  void linearisationSufficesOnceThePlaceIsKnown() {
    WeighedRun run = weigh(new Selection(49, 719, 0), Integer.MAX_VALUE);
    assertEquals(Optional.of("linear"), recommended(run));
    for (FunctionWeight function : run.functions()) {
      assertTrue(function.methods().get(0).error().largest() < 1e-3, function::toString);
    }
  }

  @Test
  void linearisationIsRefusedAtTheFirstEpoch() {
    assertRefused(weigh(new Selection(0, 0, 0), Integer.MAX_VALUE));
  }

  @Test
  void linearisationIsRefusedAtTheFirstEpochWithFourSatellites() {
    assertRefused(weigh(new Selection(0, 0, 0), 4));
  }

  private static void assertRefused(WeighedRun run) {
    assertEquals(Optional.of("hermite:5"), recommended(run));
    MethodWeight linear = run.functions().get(0).methods().get(0);
    assertTrue(linear.error().median() > 0.5, linear::toString);
    assertEquals(1, linear.shareAbove(), 0, "at the one point there is");
  }
}

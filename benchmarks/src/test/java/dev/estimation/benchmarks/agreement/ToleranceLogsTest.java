package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import dev.estimation.benchmarks.cases.gnss.GnssCase;
import dev.estimation.benchmarks.cases.robot.RobotCase;
import dev.estimation.benchmarks.cases.uwb.UwbCase;
import dev.estimation.benchmarks.cases.uwb.UwbSettings;
import dev.estimation.benchmarks.cases.vessel.VesselCase;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.ToleranceMatching;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.Pseudorange;
import dev.estimation.filters.sensor.Sight;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Filters to a tolerance of 0.01 on real logs, beside products of Gauss-Hermite nodes that have converged. */
class ToleranceLogsTest {
  private static final FilterKind TOLERANCE = FilterKind.of(ToleranceMatching.within(0.01));

  private static FilterKind product(int nodes) {
    return FilterKind.of(PointMatching.of(GaussHermiteRule.product(nodes)));
  }

  /** A receiver that starts 100 km off: 1.05 m and a NEES of 3.2 at most, with fewer evaluations than three nodes an axis. */
  @Test
  void receiverFarOff() {
    assumeTrue(ReferenceFiles.exist(), "no reference folder: not compared");
    Scenario scenario = receiver();
    RunResult run = new Replayer(scenario, TOLERANCE).run();
    assertEquals(RunResult.OK, run.status());
    assertTrue(
        run.accuracy().position().rmse() <= 1.05, "rmse " + run.accuracy().position());
    assertTrue(run.accuracy().neesMean() <= 3.2, "NEES " + run.accuracy().neesMean());
    RunResult three = new Replayer(scenario, product(3)).run();
    assertTrue(
        run.effort().evaluations() < three.effort().evaluations(),
        run.effort().evaluations() + " of " + three.effort().evaluations());
  }

  /** Its first epoch with four satellites alone, which leaves a hyperbola: linearisation says 9 m and errs by 120 m. */
  @Test
  void fourSatellites() {
    assumeTrue(ReferenceFiles.exist(), "no reference folder: not compared");
    Scenario whole = receiver();
    Measurement all = whole.steps().get(0).measurements().get(0);
    int given = all.given().length / all.rows();
    Pseudorange sensor =
        Pseudorange.ofGivenDeviation(Sight.fromGiven(Components.of(0, 1, 2)), Components.of(3));
    Measurement four = Measurement.stacked(
        sensor, 4, Arrays.copyOf(all.value(), 4), Arrays.copyOf(all.given(), 4 * given));
    Scenario first = new Scenario(
        whole.motion(),
        whole.gateProbability(),
        whole.start(),
        List.of(new Step(whole.steps().get(0).time(), List.of(four))),
        whole.truth());
    double converged = nees(first, product(15));
    assertEquals(
        converged, nees(first, product(9)), 0.02 * converged); // the reference has converged
    assertEquals(converged, nees(first, TOLERANCE), 0.1 * converged);
    double linear = nees(first, FilterKind.of(Linearisation.firstOrder()));
    assertTrue(linear > 1000, "NEES of linearisation " + linear);
  }

  @Test
  void robot() {
    compare(new RobotCase(log("mrclam6-robot3")), 5, "near", "wide");
  }

  @Test
  void vessel() {
    compare(
        new VesselCase(log("maritime-scenario16")),
        15,
        "target1-cv",
        "target1-ct",
        "target2-cv",
        "target2-ct");
  }

  @Test
  void uwb() {
    compare(new UwbCase(log("uwb-hanyang-los-a1"), UwbSettings.DEFAULT), 9, "near", "offset");
  }

  private static LogFolder log(String name) {
    assumeTrue(ReferenceFiles.exist(), "no reference folder: not compared");
    return ReferenceFiles.log(name);
  }

  private static Scenario receiver() {
    return new GnssCase(log("gnss-nya1-2024124")).load("far").scenario().orElseThrow();
  }

  private static double nees(Scenario scenario, FilterKind kind) {
    RunResult run = new Replayer(scenario, kind).run();
    assertEquals(RunResult.OK, run.status());
    return run.accuracy().neesMean();
  }

  /** Position error within 1 %, NEES within 5 %. */
  private static void compare(ReplayCase folder, int nodes, String... variants) {
    for (String variant : variants) {
      Scenario scenario = folder.load(variant).scenario().orElseThrow();
      RunResult converged = new Replayer(scenario, product(nodes)).run();
      RunResult run = new Replayer(scenario, TOLERANCE).run();
      assertEquals(RunResult.OK, run.status());
      double error = converged.accuracy().position().rmse();
      assertEquals(error, run.accuracy().position().rmse(), 0.01 * error, variant);
      double nees = converged.accuracy().neesMean();
      assertEquals(nees, run.accuracy().neesMean(), 0.05 * nees, variant);
    }
  }
}

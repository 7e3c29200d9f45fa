package dev.estimation.benchmarks.replay;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.motion.ConstantVelocity;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ReplayerTest {
  private final FirstComponent sensor = new FirstComponent();

  /** Worked by hand: prior variance 3 and noise 1 give S = 4, gain 3/4, variance 3/4. */
  @Test
  void oneUpdateGivesWhatTheFormulasGive() {
    RunResult result = run(List.of(step(5, 2)), truth(2));
    Gaussian estimate = result.history().get(0).estimate();
    assertEquals(RunResult.OK, result.status());
    assertEquals(1.5, estimate.mean(0), 1e-15); // rounding of numbers near 1, here and below
    assertEquals(0.75, estimate.covariance(0, 0), 1e-15);
    assertEquals(1, said(result).meanPerDegree(), 1e-15);
    assertEquals(
        -0.5 * (1 + Math.log(4) + Math.log(2 * Math.PI)), said(result).logLikelihood(), 1e-15);
    assertEquals(0.5, result.accuracy().position().rmse(), 1e-15);
    assertEquals(0.25 / 0.75, result.accuracy().neesMean(), 4e-15); // an error of 0.5, squared
    assertEquals(1, result.accuracy().insideFraction());
  }

  @Test
  void rejectedRowsAreCountedOverAllRows() {
    Step first = step(0, 0, 500);
    RunResult result = run(List.of(first, step(1, 0.1), step(2, -700, 0.1)), Optional.empty());
    assertEquals(List.of(1, 3), said(result).rejectedRows());
    assertEquals(3, said(result).accepted());
    assertEquals(3, result.steps());
    // A prediction at steps 1 and 2, and an update for each of the five rows.
    assertEquals(7, result.effort().evaluations());
    assertEquals(7, result.effort().jacobians());
  }

  /** Stacked or one after another, affine rows with independent noise tell the same. */
  @Test
  void stackedRowsAreOneUpdate() {
    Measurement stacked = Measurement.stacked(sensor, 2, new double[] {2, 4}, new double[0]);
    Measurement single = Measurement.stacked(sensor, 1, new double[] {1}, new double[0]);
    RunResult together =
        run(List.of(new Step(0, List.of(stacked)), new Step(1, List.of(single))), truth(2));
    RunResult apart = run(List.of(step(0, 2, 4), step(1, 1)), truth(2));
    for (int step = 0; step < 2; step++) {
      Gaussian expected = apart.history().get(step).estimate();
      Gaussian actual = together.history().get(step).estimate();
      assertEquals(expected.mean(0), actual.mean(0), 1e-15);
      assertEquals(expected.covariance(0, 0), actual.covariance(0, 0), 1e-15);
    }
    assertEquals(2, said(together).accepted());
    assertEquals(said(apart).logLikelihood(), said(together).logLikelihood(), 1e-14);
  }

  @Test
  void withoutAGateNothingIsRejected() {
    Scenario gated = scenario(List.of(step(0, 500)), Optional.empty());
    Scenario open = new Scenario(
        gated.motion(), OptionalDouble.empty(), gated.start(), gated.steps(), gated.truth());
    assertEquals(List.of(0), said(run(gated)).rejectedRows());
    assertEquals(List.of(), said(run(open)).rejectedRows());
  }

  @Test
  void aFailingStepEndsTheRunAndIsTold() {
    RunResult result = run(List.of(step(0, 1), step(1, 1), step(0.5, 1)), truth(1));
    assertTrue(result.status().startsWith("step 2 at t = 0.5 s failed: "), result.status());
    assertEquals(2, result.steps());
    assertEquals(2, result.checkpoints().size());
  }

  @Test
  void withoutTruthOrMeasurementsThereAreNoNumbers() {
    RunResult result = run(List.of(new Step(0, List.of())), Optional.empty());
    assertEquals(0, result.accuracy().count());
    assertEquals(Double.NaN, result.accuracy().position().rmse());
    assertEquals(Double.NaN, said(result).logLikelihood());
    assertEquals(Double.NaN, said(result).meanPerDegree());
  }

  @Test
  void checkpointsLieAtTenthsOfTheStepsDone() {
    List<Step> steps = new ArrayList<>();
    for (int i = 0; i < 69; i++) {
      steps.add(step(i, 0));
    }
    assertEquals(
        List.of(0, 7, 14, 20, 27, 34, 41, 48, 54, 61, 68),
        run(steps, Optional.empty()).checkpoints().stream().map(Snapshot::step).toList());
    assertEquals(
        List.of(0, 1, 2),
        run(steps.subList(0, 3), Optional.empty()).checkpoints().stream()
            .map(Snapshot::step)
            .toList());
  }

  @Test
  void aSecondRunGivesTheSame() {
    Replayer replayer = new Replayer(
        scenario(List.of(step(0, 1), step(1, 2)), truth(1)), Linearisation.firstOrder());
    RunResult first = replayer.run();
    RunResult second = replayer.run();
    assertEquals(first.history(), second.history());
    assertEquals(first.innovations(), second.innovations());
  }

  @Test
  void aMatchingThatCannotServeIsRefusedBeforehand() {
    Scenario scenario = scenario(List.of(step(0, 1)), truth(1));
    PointMatching impossible = PointMatching.of(UnscentedRule.scaled(1, 2, -2));
    assertThrows(IllegalArgumentException.class, () -> new Replayer(scenario, impossible));
  }

  private static RunResult run(List<Step> steps, Optional<Truth> truth) {
    return run(scenario(steps, truth));
  }

  private static RunResult run(Scenario scenario) {
    return new Replayer(scenario, Linearisation.firstOrder()).run();
  }

  private static Innovations said(RunResult result) {
    return result.innovations().orElseThrow();
  }

  private static Scenario scenario(List<Step> steps, Optional<Truth> truth) {
    double[] deviations = {Math.sqrt(3), 1};
    Gaussian start = Gaussian.independent(new double[2], deviations);
    return new Scenario(new ConstantVelocity(0.1), OptionalDouble.of(0.999), start, steps, truth);
  }

  private Step step(double time, double... positions) {
    return new Step(time, sensor.measurements(positions));
  }

  private static Optional<Truth> truth(double position) {
    InterpolatedTruth.Builder builder = new InterpolatedTruth.Builder(100, 0);
    builder.add(0, true, position);
    builder.add(50, true, position);
    return builder.build();
  }
}

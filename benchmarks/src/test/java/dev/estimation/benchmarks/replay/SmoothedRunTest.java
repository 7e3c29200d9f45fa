package dev.estimation.benchmarks.replay;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.motion.ConstantVelocity;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class SmoothedRunTest {
  private final FirstComponent sensor = new FirstComponent();

  /**
   * Worked by hand. Positions 0 and 1 s later, start variance 3 of the position and 0 of the
   * velocity, no process noise: the position is one constant with prior variance 3, seen twice with
   * variance 1. So both smoothed estimates are (2 + 4) / (1 + 1 + 1/3) = 18/7, variance 3/7.
   */
  @Test
  void everyStepKnowsAllMeasurements() {
    FilteredAndSmoothed both = replay(List.of(step(0, 2), step(1, 4)));
    RunResult smoothed = both.smoothed();
    assertEquals(RunResult.OK, smoothed.status());
    for (int step = 0; step < 2; step++) {
      Snapshot snapshot = smoothed.history().get(step);
      assertEquals(step, snapshot.time(), 0);
      // A few roundings of numbers near 3.
      assertEquals(18.0 / 7, snapshot.estimate().mean(0), 2e-15);
      assertEquals(3.0 / 7, snapshot.estimate().covariance(0, 0), 2e-15);
    }
    assertEquals(1.5, both.filtered().history().get(0).estimate().mean(0), 1e-15);
    assertEquals(0.75, both.filtered().history().get(0).estimate().covariance(0, 0), 1e-15);
  }

  @Test
  void scoresAreThoseOfTheSmoothedTrackAndThereAreNoInnovations() {
    RunResult smoothed = replay(List.of(step(0, 2), step(1, 4))).smoothed();
    double error = 18.0 / 7 - 2;
    assertEquals(error, smoothed.accuracy().position().rmse(), 2e-15);
    assertEquals(error * error / (3.0 / 7), smoothed.accuracy().neesMean(), 1e-14);
    assertTrue(smoothed.innovations().isEmpty());
    assertEquals(0, smoothed.effort().evaluations());
    assertEquals(0, smoothed.effort().jacobians());
  }

  @Test
  void stepsOfOneTimeShareAnEstimate() {
    RunResult smoothed = replay(List.of(step(0, 2), step(0, 4), step(1))).smoothed();
    assertEquals(3, smoothed.steps());
    for (Snapshot snapshot : smoothed.history()) {
      assertEquals(18.0 / 7, snapshot.estimate().mean(0), 2e-15);
    }
    assertArrayEquals(
        new double[] {0, 0, 1},
        smoothed.history().stream().mapToDouble(Snapshot::time).toArray(),
        0);
  }

  @Test
  void aRunThatFailedIsSmoothedAsFarAsItCame() {
    FilteredAndSmoothed both = replay(List.of(step(0, 2), step(1, 4), step(0.5, 4)));
    assertTrue(both.filtered().status().startsWith("step 2 at t = 0.5 s failed: "));
    assertEquals(both.filtered().status(), both.smoothed().status());
    assertEquals(2, both.smoothed().steps());
    assertEquals(18.0 / 7, both.smoothed().history().get(0).estimate().mean(0), 2e-15);
  }

  private FilteredAndSmoothed replay(List<Step> steps) {
    MotionModel motion = new ConstantVelocity(0);
    Gaussian start = Gaussian.independent(new double[2], new double[] {Math.sqrt(3), 0});
    Optional<Truth> truth = Optional.of(new ConstantTruth(2));
    Scenario scenario = new Scenario(motion, OptionalDouble.empty(), start, steps, truth);
    return new Replayer(scenario, Linearisation.firstOrder()).runAndSmooth();
  }

  private Step step(double time, double... positions) {
    return new Step(time, sensor.measurements(positions));
  }
}

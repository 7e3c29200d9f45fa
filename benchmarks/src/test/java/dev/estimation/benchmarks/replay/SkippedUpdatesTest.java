package dev.estimation.benchmarks.replay;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.IteratedUpdate;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.motion.ConstantVelocity;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * An iteration that does not settle is told, its row skipped, and the run goes on. Two rounds are
 * enough for an affine sensor, since the second one finds nothing left to do, and for no other.
 */
class SkippedUpdatesTest {
  /** The arc tangent of the position. */
  private static final class Slope implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = Math.atan(state[0]);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[0] = 1 / (1 + state[0] * state[0]);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 1;
    }
  }

  private final Slope slope = new Slope();
  private final FirstComponent position = new FirstComponent();

  @Test
  void rowsAreSkippedAndCounted() {
    RunResult result = run(List.of(
        new Step(0, position.measurements(500)),
        new Step(1, List.of(unsettled(), unsettled())),
        new Step(2, position.measurements(-900, 3))));
    assertEquals("NOT_CONVERGED in 2 updates, first at step 1, t = 1.0 s", result.status());
    assertEquals(3, result.steps());
    Innovations said = result.innovations().orElseThrow();
    assertEquals(1, said.accepted());
    assertEquals(List.of(0, 3), said.rejectedRows(), "skipped rows keep their numbers");
  }

  @Test
  void aFailureIsToldFirst() {
    RunResult result = run(List.of(new Step(0, List.of(unsettled())), new Step(-1, List.of())));
    assertTrue(result.status().startsWith("step 1 at t = -1.0 s failed: "), result.status());
    assertTrue(
        result.status().endsWith("; NOT_CONVERGED in 1 update, first at step 0, t = 0.0 s"),
        result.status());
  }

  private Measurement unsettled() {
    return new Measurement(slope, new double[] {0});
  }

  private static RunResult run(List<Step> steps) {
    Gaussian start = Gaussian.independent(new double[] {3, 0}, new double[] {2, 0});
    Scenario scenario = new Scenario(
        new ConstantVelocity(0), OptionalDouble.of(0.999), start, steps, Optional.empty());
    IteratedUpdate twoRounds = IteratedUpdate.undamped().withMaximumRounds(2);
    return new Replayer(scenario, FilterKind.iterated(twoRounds)).run();
  }
}

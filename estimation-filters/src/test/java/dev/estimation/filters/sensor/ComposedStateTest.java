package dev.estimation.filters.sensor;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.motion.ConstantVelocity;
import dev.estimation.filters.motion.GyroscopeAttitude;
import dev.estimation.filters.motion.MotionBlocks;
import dev.estimation.filters.motion.ReceiverClock;
import org.junit.jupiter.api.Test;

/** A sensor on a block of a larger state works as on the small one: the same points, the same estimate. */
class ComposedStateTest {
  private static final double[] SATELLITE = {2.1e4, 8e3, 1.3e4};
  private static final double[] ATTITUDE = {0.5, -0.5, 0.5, 0.5, 0, 0, 0};
  private static final double[] RATES = {0.1, -0.2, 0.3};

  /** Place, velocity, clock, after a step and a pseudorange; with an attitude before it, or without. */
  private static double[] followed(boolean withAttitude) {
    MotionModel move = MotionBlocks.of(new ConstantVelocity(1, 1, 1), new ReceiverClock(1, 0.1));
    MotionModel whole =
        withAttitude ? MotionBlocks.of(new GyroscopeAttitude(1e-6, 1e-8), move) : move;
    int numbers = withAttitude ? 7 : 0;
    int columns = withAttitude ? 6 : 0;
    FilterPlan plan = FilterPlan.unscented(whole, 1, 2, 0);
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(new Pseudorange(
        Sight.fromGiven(behind(withAttitude, numbers, numbers + 1, numbers + 2)),
        behind(withAttitude, numbers + 6),
        5));
    Estimate estimate = plan.start(0, start(whole.stateSpace(), numbers));
    assertEquals(
        StepStatus.APPLIED,
        work.predict(estimate, 2, withAttitude ? RATES : new double[0]),
        work::failure);
    // Nothing of place, velocity and clock is bent: points are drawn over the attitude and its bias
    // alone.
    assertEquals(2 * columns + 1, work.evaluations());
    assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {25900}, SATELLITE));
    assertEquals(2 * 3 + 1, port.evaluations());
    double[] got = new double[16];
    for (int i = 0; i < 8; i++) {
      got[i] = estimate.mean(numbers + i);
      got[8 + i] = estimate.standardDeviation(columns + i);
    }
    return got;
  }

  private static Components behind(boolean attitude, int... indices) {
    Components components = Components.of(indices);
    return attitude ? components.behindQuaternions(1) : components;
  }

  private static Gaussian start(Space space, int numbers) {
    double[] mean = new double[space.storage()];
    System.arraycopy(ATTITUDE, 0, mean, 0, numbers);
    double[] deviations = new double[space.dimension()];
    for (int i = 0; i < deviations.length; i++) {
      deviations[i] = i < deviations.length - 8 ? 0.01 : 10 + i - deviations.length;
    }
    return Gaussian.independent(space, mean, deviations);
  }

  /** To 1e-9 m: roundings of 26 km, times a gain below 1. */
  @Test
  void theBlockIsFollowedAsAlone() {
    double[] alone = followed(false);
    double[] composed = followed(true);
    for (int i = 0; i < 16; i++) {
      assertEquals(alone[i], composed[i], 1e-9);
    }
  }
}

package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.Motion;
import dev.estimation.testing.AllocationMeter;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** No call of a ready model allocates, but those that integrate; nor does a filter's step on blocks. */
class MotionAllocationTest {
  static List<DifferentiableMotion> models() {
    return List.of(
        new RandomWalk(1, 2),
        new ConstantVelocity(1, 2, 3),
        new ConstantAcceleration(1, 2),
        new CorrelatedAcceleration(5, 1, 2),
        new ReceiverClock(1, 2),
        new CoordinatedTurn(1, 2),
        new PolarTurn(1, 2),
        new GyroscopeAttitude(1, 2),
        (DifferentiableMotion) blocks().forOneThread());
  }

  private static Motion blocks() {
    return MotionBlocks.of(
        new GyroscopeAttitude(1e-4, 1e-6),
        MotionBlocks.of(new CoordinatedTurn(1, 2), new ReceiverClock(1, 2)));
  }

  private static double[] state(Space space) {
    double[] state = new double[space.storage()];
    Arrays.fill(state, 0.5);
    return state;
  }

  @ParameterizedTest
  @MethodSource("models")
  void callsAllocateNothing(DifferentiableMotion model) {
    Space space = model.stateSpace();
    double[] state = state(space);
    double[] control = new double[model.controlDimension()];
    double[] next = new double[space.storage()];
    double[] square = MotionFunctions.square(space.dimension());
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
      model.move(state, control, 0, 0.3, next);
      model.moveJacobian(state, control, 0, 0.3, square);
      model.processNoise(state, control, 0, 0.3, square);
    }));
  }

  @Test
  void noiseDrivenCallsAllocateNothing() {
    checkNoiseDriven(new PlanarVehicle(1, 2));
    checkNoiseDriven((DifferentiableNoiseDrivenMotion)
        MotionBlocks.of(new PlanarVehicle(1, 2), new PlanarVehicle(3, 4)).forOneThread());
  }

  private static void checkNoiseDriven(DifferentiableNoiseDrivenMotion model) {
    int d = model.stateSpace().dimension();
    double[] state = state(model.stateSpace());
    double[] control = new double[model.controlDimension()];
    double[] noise = new double[model.noiseDimension()];
    double[] next = new double[d];
    double[] byState = MotionFunctions.square(d);
    double[] byNoise = new double[d * noise.length];
    double[] covariance = MotionFunctions.square(noise.length);
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
      model.move(state, noise, control, 0, 0.3, next);
      model.moveJacobians(state, noise, control, 0, 0.3, byState, byNoise);
      model.noiseCovariance(control, 0, 0.3, covariance);
    }));
  }

  @Test
  void aFilterOnBlocksAllocatesNothing() {
    Motion motion = blocks();
    for (FilterPlan plan :
        List.of(FilterPlan.extended(motion), FilterPlan.unscented(motion, 1, 2, 0))) {
      FilterWorkspace work = plan.workspace();
      double[] deviations = new double[motion.stateSpace().dimension()];
      Arrays.fill(deviations, 0.1);
      Estimate estimate = plan.start(
          0, Gaussian.independent(motion.stateSpace(), state(motion.stateSpace()), deviations));
      double[] control = {0.1, 0.2, 0.3};
      assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
        if (work.predict(estimate, estimate.time() + 0.001, control) != StepStatus.APPLIED) {
          throw new AssertionError(work.failure());
        }
      }));
    }
  }
}

package dev.estimation.filters.filter;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.motion.GyroscopeAttitude;
import dev.estimation.filters.testing.Attitude;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.ChainMotion;
import dev.estimation.filters.testing.ChainSight;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.AllocationMeter;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The less common steps allocate nothing either. */
class VariantsAllocationTest extends BothForms {
  private static final double[] PLACES = {0, 0, 0.04, 40, 0, 0.09, 0, 30, 0.01};
  private static final double[] DISTANCES = {22.5, 29.1, 25.2};

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  private static void require(StepStatus status) {
    if (status != StepStatus.APPLIED) {
      throw new AssertionError(status);
    }
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void stackedRowsOfVaryingNumber(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(2, 1), matching));
    FilterWorkspace work = plan.workspace();
    StackedPort port = work.port(new Models.Distance(), 3);
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[] {20, 12}, new double[] {3, 4}));
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
      for (int rows = 1; rows <= 3; rows++) {
        require(work.predict(estimate, estimate.time() + 1));
        require(port.update(estimate, rows, DISTANCES, PLACES));
      }
    }));
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void noiseInside(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new Carriage(), matching));
    FilterWorkspace work = plan.workspace();
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[3], new double[] {1, 1, 0.1}));
    double[] speed = {0.5};
    assertEquals(
        0,
        AllocationMeter.bytesPerCall(
            100, 100, () -> require(work.predict(estimate, estimate.time() + 0.001, speed))));
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void quaternions(MomentMatching matching) {
    double[] state = {0.5, -0.5, 0.5, 0.5, 0.01, -0.02, 0.03};
    FilterPlan plan = formed(FilterPlan.of(new GyroscopeAttitude(1e-4, 1e-6), matching));
    FilterWorkspace work = plan.workspace();
    SensorPort direction = work.port(Attitude.knownVector(0.1));
    SensorPort camera = work.port(new Attitude.Camera(0.1));
    StackedPort cameras = work.port(new Attitude.Camera(0.1), 2);
    Estimate estimate = plan.start(
        0, Gaussian.independent(Attitude.SPACE, state, new double[] {1, 1, 1, 0.1, 0.1, 0.1}));
    double[] rates = new double[3];
    double[] up = {0, 0, 1};
    double[] seen = {0.6, 0, 0.8};
    double[] attitude = {0.8, 0.6, 0, 0};
    double[] attitudes = {0.8, 0.6, 0, 0, 1, 0, 0, 0};
    double[] nothing = new double[0];
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
      require(work.predict(estimate, estimate.time() + 0.1, rates));
      require(direction.update(estimate, seen, up));
      require(camera.update(estimate, attitude));
      require(cameras.update(estimate, 2, attitudes, nothing));
    }));
  }

  @Test
  void iteratedUpdates() {
    for (IteratedUpdate iteration :
        List.of(IteratedUpdate.undamped(), IteratedUpdate.lineSearch())) {
      FilterPlan plan = formed(FilterPlan.iteratedExtended(new ChainMotion(5), iteration));
      FilterWorkspace work = plan.workspace();
      SensorPort port = work.port(new ChainSight(5));
      Estimate estimate = plan.start(
          0, Gaussian.independent(new double[5], new double[] {0.1, 0.1, 0.1, 0.1, 0.1}));
      double[] measurement = {0.05, -0.02};
      assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
        require(work.predict(estimate, estimate.time() + 0.1));
        require(port.update(estimate, measurement));
      }));
    }
  }

  /** A carriage at a commanded speed; slip and turning noise enter inside. */
  private static final class Carriage implements DifferentiableNoiseDrivenMotion {
    private static final Space SPACE = Space.reals(2).and(Space.angles(1));

    @Override
    public Space stateSpace() {
      return SPACE;
    }

    @Override
    public int controlDimension() {
      return 1;
    }

    @Override
    public int noiseDimension() {
      return 2;
    }

    @Override
    public void move(
        double[] state, double[] noise, double[] control, double time, double dt, double[] next) {
      double way = (control[0] + noise[0]) * dt;
      next[0] = state[0] + way * Math.cos(state[2]);
      next[1] = state[1] + way * Math.sin(state[2]);
      next[2] = state[2] + noise[1] * dt;
    }

    @Override
    public void moveJacobians(
        double[] state,
        double[] noise,
        double[] control,
        double time,
        double dt,
        double[] byState,
        double[] byNoise) {
      double cos = Math.cos(state[2]);
      double sin = Math.sin(state[2]);
      double way = (control[0] + noise[0]) * dt;
      byState[0] = 1;
      byState[2] = -way * sin;
      byState[4] = 1;
      byState[5] = way * cos;
      byState[8] = 1;
      byNoise[0] = dt * cos;
      byNoise[2] = dt * sin;
      byNoise[5] = dt;
    }

    @Override
    public void noiseCovariance(double[] control, double time, double dt, double[] covariance) {
      covariance[0] = 0.01 / dt;
      covariance[3] = 0.001 / dt;
    }
  }
}

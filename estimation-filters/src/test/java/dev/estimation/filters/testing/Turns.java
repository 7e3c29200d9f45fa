package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.MotionModel;

/** Models that are linear in some of their inputs and say so. None allocates. */
public final class Turns {
  private Turns() {}

  /** Position, velocity, turn rate: linear in all but the rate, which is not zero. */
  public record Turn() implements MotionModel {
    @Override
    public Space stateSpace() {
      return Space.reals(5);
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      double rate = state[4];
      double along = Math.sin(rate * dt) / rate;
      double across = (1 - Math.cos(rate * dt)) / rate;
      next[0] = state[0] + along * state[2] - across * state[3];
      next[1] = state[1] + across * state[2] + along * state[3];
      next[2] = Math.cos(rate * dt) * state[2] - Math.sin(rate * dt) * state[3];
      next[3] = Math.sin(rate * dt) * state[2] + Math.cos(rate * dt) * state[3];
      next[4] = rate;
    }

    @Override
    public void processNoise(double[] state, double[] control, double time, double dt, double[] q) {
      for (int i = 0; i < 4; i++) {
        q[6 * i] = 0.1;
      }
      q[24] = 1e-5;
    }
  }

  /** How fast the distance to a given place grows: linear in the velocity. Variance 0.04. */
  public record RangeRate() implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public int givenDimension() {
      return 2;
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(2, 0, 3, 1).withLinearInputs(3, 2);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      double x = state[0] - given[0];
      double y = state[1] - given[1];
      measurement[0] = (x * state[2] + y * state[3]) / Math.hypot(x, y);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      double x = state[0] - given[0];
      double y = state[1] - given[1];
      double range = Math.hypot(x, y);
      double across = (x * state[3] - y * state[2]) / (range * range * range);
      jacobian[0] = -y * across;
      jacobian[1] = x * across;
      jacobian[2] = x / range;
      jacobian[3] = y / range;
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 0.04;
    }
  }

  /**
   * x, y, heading at a commanded speed; slip, and a drift of the direction, are noise. Linear in place and slip,
   * and how slip acts depends on the drift.
   */
  public record Slip() implements DifferentiableNoiseDrivenMotion {
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
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(0, 1, 3);
    }

    @Override
    public void move(
        double[] state, double[] noise, double[] control, double time, double dt, double[] next) {
      double way = (control[0] + noise[0]) * dt;
      next[0] = state[0] + way * Math.cos(state[2] + noise[1]);
      next[1] = state[1] + way * Math.sin(state[2] + noise[1]);
      next[2] = state[2] + noise[1];
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
      double cos = Math.cos(state[2] + noise[1]);
      double sin = Math.sin(state[2] + noise[1]);
      double way = (control[0] + noise[0]) * dt;
      byState[0] = 1;
      byState[4] = 1;
      byState[8] = 1;
      byState[2] = -way * sin;
      byState[5] = way * cos;
      byNoise[0] = dt * cos;
      byNoise[1] = -way * sin;
      byNoise[2] = dt * sin;
      byNoise[3] = way * cos;
      byNoise[5] = 1;
    }

    @Override
    public void noiseCovariance(double[] control, double time, double dt, double[] covariance) {
      covariance[0] = 0.3;
      covariance[1] = 0.05;
      covariance[2] = 0.05;
      covariance[3] = 0.06;
    }
  }
}

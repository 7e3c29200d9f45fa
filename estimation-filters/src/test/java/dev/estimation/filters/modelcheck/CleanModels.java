package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/** Right models, some of them hard, and the bases of broken ones. */
final class CleanModels {
  private CleanModels() {}

  /** A lift in a shaft: height and speed, pushed by white acceleration of 0.04 m^2/s^3. */
  static class Lift implements DifferentiableMotion {
    static final double DENSITY = 0.04;

    @Override
    public Space stateSpace() {
      return Space.reals(2);
    }

    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      next[0] = x[0] + dt * x[1];
      next[1] = x[1];
    }

    @Override
    public void moveJacobian(double[] x, double[] control, double t, double dt, double[] jacobian) {
      jacobian[0] = 1;
      jacobian[1] = dt;
      jacobian[3] = 1;
    }

    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      q[0] = DENSITY * dt * dt * dt / 3;
      q[1] = DENSITY * dt * dt / 2;
      q[2] = q[1];
      q[3] = DENSITY * dt;
    }
  }

  /** A drone that turns: position, velocity, turn rate; the rate may be zero. */
  static class Turning implements MotionModel {
    @Override
    public Space stateSpace() {
      return Space.reals(5);
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3);
    }

    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      double angle = x[4] * dt;
      double half = angle / 2;
      // Two terms are right to 1e-17 below 1e-4.
      double chord = Math.abs(half) < 1e-4 ? 1 - half * half / 6 : Math.sin(half) / half;
      double along = dt * chord * Math.cos(half);
      double across = dt * chord * Math.sin(half);
      next[0] = x[0] + along * x[2] - across * x[3];
      next[1] = x[1] + across * x[2] + along * x[3];
      next[2] = Math.cos(angle) * x[2] - Math.sin(angle) * x[3];
      next[3] = Math.sin(angle) * x[2] + Math.cos(angle) * x[3];
      next[4] = x[4];
    }

    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      q[12] = 0.01 * dt;
      q[18] = 0.01 * dt;
      q[24] = 1e-4 * dt;
    }
  }

  /** Range and bearing, off the bow, of a lit buoy whose place is given; state east, north, heading. */
  static class BuoySight implements TwiceDifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1).and(Space.angles(1));
    }

    @Override
    public int givenDimension() {
      return 2;
    }

    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      double east = buoy[0] - x[0];
      double north = buoy[1] - x[1];
      z[0] = Math.hypot(east, north);
      z[1] = Math.atan2(east, north) - x[2];
    }

    @Override
    public void measureJacobian(double[] x, double[] buoy, double[] jacobian) {
      double east = buoy[0] - x[0];
      double north = buoy[1] - x[1];
      double square = east * east + north * north;
      double range = Math.sqrt(square);
      jacobian[0] = -east / range;
      jacobian[1] = -north / range;
      jacobian[3] = -north / square;
      jacobian[4] = east / square;
      jacobian[5] = -1;
    }

    @Override
    public void measureHessian(double[] x, double[] buoy, double[] hessians) {
      double east = buoy[0] - x[0];
      double north = buoy[1] - x[1];
      double square = east * east + north * north;
      double cube = square * Math.sqrt(square);
      hessians[0] = north * north / cube;
      hessians[1] = -east * north / cube;
      hessians[3] = hessians[1];
      hessians[4] = east * east / cube;
      hessians[9] = -2 * east * north / (square * square);
      hessians[10] = (east * east - north * north) / (square * square);
      hessians[12] = hessians[10];
      hessians[13] = -hessians[9];
    }

    @Override
    public void measurementNoise(double[] x, double[] buoy, double[] r) {
      r[0] = 4;
      r[3] = 1e-4;
    }
  }

  /** The distance to a satellite at a given place, and the clock's error in m; state position and clock. */
  static class Pseudorange implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public int givenDimension() {
      return 3;
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(3);
    }

    @Override
    public void measure(double[] x, double[] satellite, double[] z) {
      z[0] = distance(x, satellite) + x[3];
    }

    private static double distance(double[] x, double[] satellite) {
      double sum = 0;
      for (int i = 0; i < 3; i++) {
        sum += (satellite[i] - x[i]) * (satellite[i] - x[i]);
      }
      return Math.sqrt(sum);
    }

    @Override
    public void measureJacobian(double[] x, double[] satellite, double[] jacobian) {
      double distance = distance(x, satellite);
      for (int i = 0; i < 3; i++) {
        jacobian[i] = (x[i] - satellite[i]) / distance;
      }
      jacobian[3] = 1;
    }

    @Override
    public void measurementNoise(double[] x, double[] satellite, double[] r) {
      r[0] = 1;
    }
  }

  /** A cart on wheels: place and heading; speed and turn rate are commanded and slip. */
  static class Cart implements DifferentiableNoiseDrivenMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(2).and(Space.angles(1));
    }

    @Override
    public int controlDimension() {
      return 2;
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
        double[] x, double[] slip, double[] control, double t, double dt, double[] next) {
      double way = (control[0] + slip[0]) * dt;
      double turn = (control[1] + slip[1]) * dt;
      next[0] = x[0] + way * Math.cos(x[2] + turn / 2);
      next[1] = x[1] + way * Math.sin(x[2] + turn / 2);
      next[2] = x[2] + turn;
    }

    @Override
    public void moveJacobians(
        double[] x,
        double[] slip,
        double[] control,
        double t,
        double dt,
        double[] byState,
        double[] byNoise) {
      double way = (control[0] + slip[0]) * dt;
      double middle = x[2] + (control[1] + slip[1]) * dt / 2;
      byState[0] = 1;
      byState[2] = -way * Math.sin(middle);
      byState[4] = 1;
      byState[5] = way * Math.cos(middle);
      byState[8] = 1;
      byNoise[0] = dt * Math.cos(middle);
      byNoise[1] = -way * Math.sin(middle) * dt / 2;
      byNoise[2] = dt * Math.sin(middle);
      byNoise[3] = way * Math.cos(middle) * dt / 2;
      byNoise[5] = dt;
    }

    @Override
    public void noiseCovariance(double[] control, double t, double dt, double[] q) {
      q[0] = 0.01 / dt;
      q[3] = 0.001 / dt;
    }
  }

  /** A float on waves of a known period, pulled back to its mooring: linear, with noise in closed form. */
  static class Mooring implements MotionModel {
    private static final double RATE = 0.1;

    @Override
    public Space stateSpace() {
      return Space.reals(1);
    }

    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      next[0] = x[0] * Math.exp(-RATE * dt);
    }

    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      q[0] = 0.3 * -Math.expm1(-2 * RATE * dt);
    }
  }

  /** Two hyperbolic distances whose large parts cancel; the places of two masts are given. */
  static class DistanceDifference implements SensorModel {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public int givenDimension() {
      return 4;
    }

    @Override
    public void measure(double[] x, double[] masts, double[] z) {
      z[0] = Math.hypot(x[0] - masts[0], x[1] - masts[1])
          - Math.hypot(x[0] - masts[2], x[1] - masts[3]);
    }

    @Override
    public void measurementNoise(double[] x, double[] masts, double[] r) {
      r[0] = 9;
    }
  }
}

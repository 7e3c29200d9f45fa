package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import java.util.Arrays;

/** A lift with added noise and a cart with noise inside, each time with one fault. */
final class BrokenMotions {
  private BrokenMotions() {}

  static class LiftWrongSlope extends CleanModels.Lift {
    @Override
    public void moveJacobian(double[] x, double[] control, double t, double dt, double[] jacobian) {
      super.moveJacobian(x, control, t, dt, jacobian);
      jacobian[1] = 1;
    }
  }

  /** Drag, with half of the right second derivative. */
  static class WrongBend extends CleanModels.Lift implements TwiceDifferentiableMotion {
    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      super.move(x, control, t, dt, next);
      next[1] -= 0.01 * dt * x[1] * x[1];
    }

    @Override
    public void moveJacobian(double[] x, double[] control, double t, double dt, double[] jacobian) {
      super.moveJacobian(x, control, t, dt, jacobian);
      jacobian[3] -= 0.02 * dt * x[1];
    }

    @Override
    public void moveHessian(double[] x, double[] control, double t, double dt, double[] hessians) {
      hessians[7] = -0.01 * dt;
    }
  }

  static class LiftForgottenInput extends CleanModels.Lift {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0);
    }
  }

  /** Noise on the speed alone: the height's part, which grows by the third power of time, is left out. */
  static class SpeedNoiseOnly extends CleanModels.Lift {
    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      q[3] = DENSITY * dt;
    }
  }

  /** The same noise whatever the step. */
  static class NoiseWithoutTime extends CleanModels.Lift {
    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      q[0] = 0.01;
      q[3] = 0.04;
    }
  }

  static class LiftHalfNoise extends CleanModels.Lift {
    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      super.processNoise(x, control, t, dt, q);
      q[2] = 0;
    }
  }

  /** A variance below zero where the lift goes down. */
  static class NegativeVariance extends CleanModels.Lift {
    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      q[0] = 0.01 * dt * x[1];
      q[3] = DENSITY * dt;
    }
  }

  /** The sum in the input's array. */
  static class LiftWritesOnState extends CleanModels.Lift {
    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      x[0] += dt * x[1];
      next[0] = x[0];
      next[1] = x[1];
    }
  }

  static class LiftUnfilled extends CleanModels.Lift {
    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      next[0] = x[0] + dt * x[1];
    }
  }

  /** The step of the call before. */
  static class LastStep extends CleanModels.Lift {
    private double last;

    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      super.move(x, control, t, last, next);
      last = dt;
    }
  }

  /** Counts its calls. */
  static class Counts extends CleanModels.Lift {
    private int calls;

    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      super.processNoise(x, control, t, dt, q);
      q[3] += calls++;
    }
  }

  static class LiftNotFinite extends CleanModels.Lift {
    @Override
    public void moveJacobian(double[] x, double[] control, double t, double dt, double[] jacobian) {
      super.moveJacobian(x, control, t, dt, jacobian);
      jacobian[1] = dt * x[1] / x[1];
    }
  }

  static class LiftAllocates extends CleanModels.Lift {
    private double[] scratch = new double[2];

    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      scratch = new double[4];
      super.processNoise(x, control, t, dt, scratch);
      System.arraycopy(scratch, 0, q, 0, 4);
    }
  }

  /** For one thread without the friction that it was built with. */
  static class ForgetsFriction extends CleanModels.Lift {
    private final double friction;

    ForgetsFriction(double friction) {
      this.friction = friction;
    }

    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      super.move(x, control, t, dt, next);
      next[1] -= friction * dt;
    }

    @Override
    public ForgetsFriction forOneThread() {
      return new ForgetsFriction(0);
    }
  }

  /** Quite another motion for one thread. */
  static class TakesAnother extends CleanModels.Lift {
    @Override
    public CleanModels.Mooring forOneThread() {
      return new CleanModels.Mooring();
    }
  }

  /** A heading among the reals, which the model wraps. */
  static class HeadingAsReal extends CleanModels.Cart {
    @Override
    public Space stateSpace() {
      return Space.reals(3);
    }

    @Override
    public void move(
        double[] x, double[] slip, double[] control, double t, double dt, double[] next) {
      super.move(x, slip, control, t, dt, next);
      next[2] = Math.IEEEremainder(next[2], 2 * Math.PI);
    }
  }

  /** Turns less the further the heading is from 0. */
  static class ReturningHeading extends CleanModels.Cart {
    @Override
    public void move(
        double[] x, double[] slip, double[] control, double t, double dt, double[] next) {
      super.move(x, slip, control, t, dt, next);
      next[2] -= 0.1 * dt * x[2];
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
      super.moveJacobians(x, slip, control, t, dt, byState, byNoise);
      byState[8] -= 0.1 * dt;
    }
  }

  static class CartWrongSlope extends CleanModels.Cart {
    @Override
    public void moveJacobians(
        double[] x,
        double[] slip,
        double[] control,
        double t,
        double dt,
        double[] byState,
        double[] byNoise) {
      super.moveJacobians(x, slip, control, t, dt, byState, byNoise);
      byNoise[1] *= 2;
    }
  }

  static class CartNotLinear extends CleanModels.Cart {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(0, 1, 3, 4);
    }
  }

  static class CartForgottenNoise extends CleanModels.Cart {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1, 2, 3);
    }
  }

  static class CartUnreadNoise extends CleanModels.Cart {
    private final double[] two = new double[6];

    @Override
    public int noiseDimension() {
      return 3;
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
      Arrays.fill(two, 0);
      super.moveJacobians(x, slip, control, t, dt, byState, two);
      for (int row = 0; row < 3; row++) {
        System.arraycopy(two, 2 * row, byNoise, 3 * row, 2);
      }
    }

    @Override
    public void noiseCovariance(double[] control, double t, double dt, double[] q) {
      q[0] = 0.01 / dt;
      q[4] = 0.001 / dt;
      q[8] = 1;
    }
  }

  static class CartHalfNoise extends CleanModels.Cart {
    @Override
    public void noiseCovariance(double[] control, double t, double dt, double[] q) {
      super.noiseCovariance(control, t, dt, q);
      q[1] = 1e-4;
    }
  }

  static class CartNegativeVariance extends CleanModels.Cart {
    @Override
    public void noiseCovariance(double[] control, double t, double dt, double[] q) {
      super.noiseCovariance(control, t, dt, q);
      q[3] = 1e-3 * control[1];
    }
  }

  static class CartWritesOnNoise extends CleanModels.Cart {
    @Override
    public void move(
        double[] x, double[] slip, double[] control, double t, double dt, double[] next) {
      slip[0] += control[0];
      double speed = slip[0];
      slip[0] -= control[0];
      slip[1] *= 2;
      next[0] = x[0] + speed * dt * Math.cos(x[2] + (control[1] + slip[1] / 2) * dt / 2);
      next[1] = x[1] + speed * dt * Math.sin(x[2] + (control[1] + slip[1] / 2) * dt / 2);
      next[2] = x[2] + (control[1] + slip[1] / 2) * dt;
    }
  }

  static class CartWritesOnControl extends CleanModels.Cart {
    @Override
    public void noiseCovariance(double[] control, double t, double dt, double[] q) {
      control[0] = Math.abs(control[0]) + 1;
      super.noiseCovariance(control, t, dt, q);
    }
  }

  static class CartThrows extends CleanModels.Cart {
    @Override
    public void move(
        double[] x, double[] slip, double[] control, double t, double dt, double[] next) {
      super.move(x, slip, control, t, dt, next);
      next[1] += 0 * x[(int) (3 + x[2] / 4)];
    }
  }
}

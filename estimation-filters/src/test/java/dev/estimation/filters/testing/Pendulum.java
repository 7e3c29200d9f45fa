package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/**
 * A pendulum driven by white noise and seen from the side: the textbook example of Sarkka 2013,
 * <i>Bayesian Filtering and Smoothing</i>, examples 3.7 and 5.1 (structure and parameters second
 * hand, from public pages that cite the book). The angle is a plain real there.
 */
public final class Pendulum implements TwiceDifferentiableMotion {
  private static final double GRAVITY = 9.81;
  private static final double DENSITY = 0.01;

  @Override
  public Space stateSpace() {
    return Space.reals(2);
  }

  /** Linear in the rate. */
  @Override
  public Structure structure() {
    return Structure.UNKNOWN.withLinearInputs(1);
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    next[0] = state[0] + state[1] * dt;
    next[1] = state[1] - GRAVITY * Math.sin(state[0]) * dt;
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    jacobian[0] = 1;
    jacobian[1] = dt;
    jacobian[2] = -GRAVITY * Math.cos(state[0]) * dt;
    jacobian[3] = 1;
  }

  @Override
  public void moveHessian(
      double[] state, double[] control, double time, double dt, double[] hessians) {
    hessians[4] = GRAVITY * Math.sin(state[0]) * dt;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    new PlainLine(DENSITY).processNoise(state, control, time, dt, covariance);
  }

  /** The sine of the angle, variance 0.1. */
  public static final class SideView implements TwiceDifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = Math.sin(state[0]);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[0] = Math.cos(state[0]);
    }

    @Override
    public void measureHessian(double[] state, double[] given, double[] hessians) {
      hessians[0] = -Math.sin(state[0]);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 0.1;
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0);
    }
  }
}

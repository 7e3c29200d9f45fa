package dev.estimation.filters.testing;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * Position and velocity on one line, driven by white acceleration of a given spectral density. It tells nothing of its
 * structure, so that matchings draw points over it.
 */
public final class PlainLine implements DifferentiableMotion {
  private final double density;

  /** The spectral density of the acceleration, m^2/s^3. */
  public PlainLine(double density) {
    this.density = density;
  }

  @Override
  public Space stateSpace() {
    return Space.reals(2);
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    next[0] = state[0] + dt * state[1];
    next[1] = state[1];
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    jacobian[0] = 1;
    jacobian[1] = dt;
    jacobian[3] = 1;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    covariance[0] = density * dt * dt * dt / 3;
    covariance[1] = density * dt * dt / 2;
    covariance[2] = covariance[1];
    covariance[3] = density * dt;
  }
}

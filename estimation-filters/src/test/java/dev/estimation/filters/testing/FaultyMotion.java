package dev.estimation.filters.testing;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/** Two components under a control each; one fault at a time can be switched on. */
public final class FaultyMotion implements DifferentiableMotion {
  /** What is wrong. */
  public enum Fault {
    /** Nothing. */
    NONE,
    /** The next state is NaN. */
    NAN,
    /** The second component is left out. */
    UNFILLED,
    /** The model throws. */
    THROWS,
    /** The noise has a NaN. */
    NAN_NOISE,
    /** A variance is negative. */
    NEGATIVE_NOISE,
    /** The noise is not symmetric. */
    ASYMMETRIC_NOISE,
    /** The noise has positive variances, but is indefinite. */
    INDEFINITE_NOISE
  }

  private Fault fault = Fault.NONE;

  /** Switches a fault on. */
  public void set(Fault next) {
    fault = next;
  }

  @Override
  public Space stateSpace() {
    return Space.reals(2);
  }

  @Override
  public int controlDimension() {
    return 2;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    if (fault == Fault.THROWS) {
      throw new IllegalStateException("engine stalled");
    }
    next[0] = fault == Fault.NAN ? Double.NaN : state[0] + dt * control[0];
    if (fault != Fault.UNFILLED) {
      next[1] = state[1] + dt * control[1];
    }
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    jacobian[0] = 1;
    jacobian[3] = 1;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    covariance[0] = dt;
    covariance[3] = dt;
    switch (fault) {
      case NAN_NOISE -> covariance[3] = Double.NaN;
      case NEGATIVE_NOISE -> covariance[3] = -1e-9;
      case ASYMMETRIC_NOISE -> covariance[2] = 0.5;
      case INDEFINITE_NOISE -> {
        covariance[1] = 2 * dt;
        covariance[2] = 2 * dt;
      }
      default -> {}
    }
  }
}

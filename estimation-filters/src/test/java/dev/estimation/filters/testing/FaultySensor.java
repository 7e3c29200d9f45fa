package dev.estimation.filters.testing;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/** Sees the first two components of a state; one fault at a time can be switched on. */
public final class FaultySensor implements DifferentiableSensor {
  /** What is wrong. */
  public enum Fault {
    /** Nothing. */
    NONE,
    /** The measurement is NaN. */
    NAN,
    /** The measurement is infinite. */
    INFINITE,
    /** The second component is left out. */
    UNFILLED,
    /** The model throws. */
    THROWS,
    /** The Jacobian has a NaN. */
    NAN_JACOBIAN,
    /** The noise has a NaN. */
    NAN_NOISE,
    /** A variance is zero. */
    ZERO_NOISE,
    /** A variance is negative. */
    NEGATIVE_NOISE,
    /** The noise is not symmetric. */
    ASYMMETRIC_NOISE,
    /** The noise is symmetric with positive variances, but indefinite. */
    INDEFINITE_NOISE
  }

  private Fault fault = Fault.NONE;

  /** Switches a fault on. */
  public void set(Fault next) {
    fault = next;
  }

  @Override
  public Space measurementSpace() {
    return Space.reals(2);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    if (fault == Fault.THROWS) {
      throw new IllegalStateException("sensor unplugged");
    }
    measurement[0] = fault == Fault.NAN ? Double.NaN : state[0];
    if (fault != Fault.UNFILLED) {
      measurement[1] = fault == Fault.INFINITE ? Double.POSITIVE_INFINITY : state[1];
    }
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    int columns = jacobian.length / 2;
    jacobian[0] = 1;
    jacobian[columns + 1] = fault == Fault.NAN_JACOBIAN ? Double.NaN : 1;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    covariance[0] = 1;
    covariance[3] = 1;
    switch (fault) {
      case NAN_NOISE -> covariance[3] = Double.NaN;
      case ZERO_NOISE -> covariance[3] = 0;
      case NEGATIVE_NOISE -> covariance[0] = -1e-9;
      case ASYMMETRIC_NOISE -> covariance[1] = 0.5;
      case INDEFINITE_NOISE -> {
        covariance[1] = 2;
        covariance[2] = 2;
      }
      default -> {}
    }
  }
}

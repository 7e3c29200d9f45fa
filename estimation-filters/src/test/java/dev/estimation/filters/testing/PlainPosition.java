package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/** The first component of a state, seen with a given variance. It does not tell that it is linear. */
public final class PlainPosition implements DifferentiableSensor {
  private final int stateDimension;
  private final double variance;

  /** A sensor for states of the given dimension. */
  public PlainPosition(int stateDimension, double variance) {
    this.stateDimension = stateDimension;
    this.variance = variance;
  }

  @Override
  public Space measurementSpace() {
    return Space.reals(1);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = state[0];
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    if (jacobian.length != stateDimension) {
      throw new AssertionError("jacobian of length " + jacobian.length);
    }
    jacobian[0] = 1;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    covariance[0] = variance;
  }

  @Override
  public Structure structure() {
    return Structure.UNKNOWN.withActiveInputs(0);
  }
}

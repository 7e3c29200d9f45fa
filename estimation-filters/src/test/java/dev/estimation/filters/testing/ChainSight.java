package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/** A length and an angle made from the last and the first of n components. */
public final class ChainSight implements DifferentiableSensor {
  private final int n;
  private final Space space = Space.reals(1).and(Space.angles(1));

  /** A sensor for states of n components, 2 or more. */
  public ChainSight(int n) {
    this.n = n;
  }

  @Override
  public Space measurementSpace() {
    return space;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = Math.exp(state[n - 1]) - 1;
    measurement[1] = Math.atan2(state[0], 2 + state[n - 1]);
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    double ahead = 2 + state[n - 1];
    double square = ahead * ahead + state[0] * state[0];
    jacobian[n - 1] = Math.exp(state[n - 1]);
    jacobian[n] = ahead / square;
    jacobian[n + n - 1] = -state[0] / square;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    covariance[0] = 0.01;
    covariance[3] = 0.01;
  }

  @Override
  public Structure structure() {
    return Structure.UNKNOWN.withActiveInputs(n - 1, 0);
  }
}

package dev.estimation.filters.testing;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * Independent components that wander: variance of the step = rate times dt. It tells nothing of its structure, so
 * that matchings draw points over it.
 */
public final class PlainWalk implements DifferentiableMotion {
  private final int dimension;
  private final double rate;

  /** A walk in the given dimension, variance rate in unit^2/s. */
  public PlainWalk(int dimension, double rate) {
    this.dimension = dimension;
    this.rate = rate;
  }

  @Override
  public Space stateSpace() {
    return Space.reals(dimension);
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    System.arraycopy(state, 0, next, 0, dimension);
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    fillDiagonal(1, jacobian);
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    fillDiagonal(rate * dt, covariance);
  }

  private void fillDiagonal(double value, double[] matrix) {
    for (int i = 0; i < dimension; i++) {
      matrix[i * (dimension + 1)] = value;
    }
  }
}

package dev.estimation.benchmarks.cases.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * Constant velocity on a number of axes, disturbed by white acceleration: position' = position + dt
 * velocity. State: all positions (m), then all velocities (m/s). <i>Immutable.</i>
 */
public final class ConstantVelocity implements DifferentiableMotion {
  private final double[] spectralDensities;
  private final FlatSpace space;
  private final Structure structure;

  /**
   * The model.
   *
   * @param spectralDensities of the acceleration (m^2/s^3), one for each axis; copied
   */
  public ConstantVelocity(double... spectralDensities) {
    this.spectralDensities = spectralDensities.clone();
    this.space = Space.reals(2 * spectralDensities.length);
    int[] all = Structure.UNKNOWN.activeInputs(space.dimension());
    this.structure = Structure.UNKNOWN.withLinearInputs(all);
  }

  @Override
  public FlatSpace stateSpace() {
    return space;
  }

  /** Linear in all. */
  @Override
  public Structure structure() {
    return structure;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    int axes = spectralDensities.length;
    for (int i = 0; i < axes; i++) {
      next[i] = state[i] + dt * state[axes + i];
      next[axes + i] = state[axes + i];
    }
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    int axes = spectralDensities.length;
    int n = 2 * axes;
    for (int i = 0; i < axes; i++) {
      jacobian[i * n + i] = 1;
      jacobian[i * n + axes + i] = dt;
      jacobian[(axes + i) * n + axes + i] = 1;
    }
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    int axes = spectralDensities.length;
    for (int i = 0; i < axes; i++) {
      WhiteAcceleration.fill(spectralDensities[i], dt, i, axes + i, covariance, 2 * axes);
    }
  }
}

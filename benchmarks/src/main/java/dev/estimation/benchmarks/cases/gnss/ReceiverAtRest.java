package dev.estimation.benchmarks.cases.gnss;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * A receiver at rest with a clock that drifts. State: x, y, z (m, Earth-fixed), clock (m), clock
 * drift (m/s). The position walks at random, a little, to keep its covariance honest when errors
 * stay the same for minutes; so does the drift, and the clock on top of it. <i>Immutable.</i>
 */
final class ReceiverAtRest implements DifferentiableMotion {
  private static final int DIMENSION = 5;
  private static final int CLOCK = 3;
  private static final int DRIFT = 4;
  private static final FlatSpace SPACE = Space.reals(DIMENSION);
  private static final Structure LINEAR = Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3, 4);

  private final double positionDensity;
  private final double clockDensity;
  private final double driftDensity;

  /**
   * The model.
   *
   * @param positionDensity spectral density of the velocity (m^2/s)
   * @param clockDensity spectral density of the clock's own noise (m^2/s)
   * @param driftDensity spectral density of the change of the drift (m^2/s^3)
   */
  ReceiverAtRest(double positionDensity, double clockDensity, double driftDensity) {
    this.positionDensity = positionDensity;
    this.clockDensity = clockDensity;
    this.driftDensity = driftDensity;
  }

  @Override
  public FlatSpace stateSpace() {
    return SPACE;
  }

  @Override
  public Structure structure() {
    return LINEAR;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    System.arraycopy(state, 0, next, 0, DIMENSION);
    next[CLOCK] = state[CLOCK] + dt * state[DRIFT];
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    for (int i = 0; i < DIMENSION; i++) {
      jacobian[i * DIMENSION + i] = 1;
    }
    jacobian[CLOCK * DIMENSION + DRIFT] = dt;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    for (int i = 0; i < CLOCK; i++) {
      covariance[i * DIMENSION + i] = positionDensity * dt;
    }
    double mixed = driftDensity * dt * dt / 2;
    covariance[CLOCK * DIMENSION + CLOCK] = clockDensity * dt + driftDensity * dt * dt * dt / 3;
    covariance[CLOCK * DIMENSION + DRIFT] = mixed;
    covariance[DRIFT * DIMENSION + CLOCK] = mixed;
    covariance[DRIFT * DIMENSION + DRIFT] = driftDensity * dt;
  }
}

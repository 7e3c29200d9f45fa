package dev.estimation.benchmarks.cases.vessel;

import dev.estimation.benchmarks.cases.motion.TurnArc;
import dev.estimation.benchmarks.cases.motion.WhiteAcceleration;
import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * A turn at constant speed and turn rate, disturbed by white acceleration and a turn rate that
 * walks at random. State: north, east (m), velocity north, east (m/s), turn rate (rad/s), positive
 * from north to east. With u = turn rate * dt, the arc is written by sin(u)/u and (1 - cos(u))/u,
 * which exist for a straight course as well. <i>Immutable.</i>
 */
final class CoordinatedTurn implements DifferentiableMotion {
  private static final int DIMENSION = 5;
  private static final FlatSpace SPACE = Space.reals(DIMENSION);
  private static final Structure LINEAR_BUT_FOR_RATE =
      Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3);

  private final double accelerationDensity;
  private final double turnDensity;

  /**
   * The model.
   *
   * @param accelerationDensity spectral density of the acceleration (m^2/s^3)
   * @param turnDensity spectral density of the turn acceleration (rad^2/s^3)
   */
  CoordinatedTurn(double accelerationDensity, double turnDensity) {
    this.accelerationDensity = accelerationDensity;
    this.turnDensity = turnDensity;
  }

  @Override
  public FlatSpace stateSpace() {
    return SPACE;
  }

  @Override
  public Structure structure() {
    return LINEAR_BUT_FOR_RATE;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    double north = state[2];
    double east = state[3];
    double u = state[4] * dt;
    double along = TurnArc.along(u);
    double across = TurnArc.across(u);
    double cos = Math.cos(u);
    double sin = Math.sin(u);
    next[0] = state[0] + dt * (along * north - across * east);
    next[1] = state[1] + dt * (across * north + along * east);
    next[2] = cos * north - sin * east;
    next[3] = sin * north + cos * east;
    next[4] = state[4];
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    double north = state[2];
    double east = state[3];
    double u = state[4] * dt;
    double cos = Math.cos(u);
    double sin = Math.sin(u);
    double along = dt * TurnArc.along(u);
    double across = dt * TurnArc.across(u);
    double alongRate = TurnArc.alongDerivative(u);
    double acrossRate = TurnArc.acrossDerivative(u);
    row(jacobian, 0, along, -across, dt * dt * (alongRate * north - acrossRate * east));
    row(jacobian, 1, across, along, dt * dt * (acrossRate * north + alongRate * east));
    row(jacobian, 2, cos, -sin, -dt * (sin * north + cos * east));
    row(jacobian, 3, sin, cos, dt * (cos * north - sin * east));
    jacobian[0] = 1;
    jacobian[DIMENSION + 1] = 1;
    jacobian[DIMENSION * DIMENSION - 1] = 1;
  }

  private static void row(
      double[] jacobian, int row, double byNorth, double byEast, double byTurnRate) {
    jacobian[row * DIMENSION + 2] = byNorth;
    jacobian[row * DIMENSION + 3] = byEast;
    jacobian[row * DIMENSION + 4] = byTurnRate;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    WhiteAcceleration.fill(accelerationDensity, dt, 0, 2, covariance, DIMENSION);
    WhiteAcceleration.fill(accelerationDensity, dt, 1, 3, covariance, DIMENSION);
    covariance[DIMENSION * DIMENSION - 1] = turnDensity * dt;
  }
}

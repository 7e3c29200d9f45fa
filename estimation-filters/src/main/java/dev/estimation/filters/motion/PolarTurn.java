package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * A turn at constant speed and turn rate, disturbed by white acceleration along the course and a turn rate that walks at
 * random; velocity as speed and heading. State: x, y (m), speed (m/s), heading (rad, from x towards y), turn rate
 * (rad/s). With u = turn rate dt / 2,
 *
 * <pre>
 * x' = x + speed dt sin(u)/u cos(heading + u)
 * y' = y + speed dt sin(u)/u sin(heading + u)        heading' = heading + 2 u
 * </pre>
 *
 * <p>Q is that of a straight course in the direction heading + u: along it place and speed as {@link ConstantVelocity}
 * with density q, across it place / speed, heading and turn rate as {@link ConstantAcceleration} with density r. So it
 * is right to leading order in the angle turned; take steps short against a turn. Against {@link CoordinatedTurn}
 * this model disturbs the speed and not the course by the acceleration, which suits ships and vehicles.
 *
 * <p>Linear in place and speed once heading and turn rate are given. <i>Immutable.</i> Allocates nothing. Source:
 * Roth, Hendeby and Gustafsson 2014, <i>EKF/UKF maneuvering target tracking using coordinated turn models with
 * polar/Cartesian velocity</i>, FUSION (from memory).
 */
public final class PolarTurn implements DifferentiableMotion {
  private static final int DIMENSION = 5;
  private static final int SPEED = 2;
  private static final int HEADING = 3;
  private static final int RATE = 4;
  private static final FlatSpace SPACE = Space.reals(3).and(Space.angles(1)).and(Space.reals(1));
  private static final Structure LINEAR = Structure.UNKNOWN.withLinearInputs(0, 1, SPEED);

  private final double accelerationDensity;
  private final double turnDensity;

  /**
   * The model.
   *
   * @param accelerationDensity q, spectral density of the acceleration along the course (m^2/s^3), finite and 0 or more
   * @param turnDensity r, spectral density of the turn acceleration (rad^2/s^3), finite and 0 or more
   */
  public PolarTurn(double accelerationDensity, double turnDensity) {
    this.accelerationDensity =
        Parameters.notNegative("PolarTurn accelerationDensity", accelerationDensity);
    this.turnDensity = Parameters.notNegative("PolarTurn turnDensity", turnDensity);
  }

  @Override
  public FlatSpace stateSpace() {
    return SPACE;
  }

  /** {@return a structure that says: linear in place and speed} */
  @Override
  public Structure structure() {
    return LINEAR;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    double u = state[RATE] * dt / 2;
    double chord = state[SPEED] * dt * TurnArc.along(u);
    next[0] = state[0] + chord * Math.cos(state[HEADING] + u);
    next[1] = state[1] + chord * Math.sin(state[HEADING] + u);
    next[SPEED] = state[SPEED];
    next[HEADING] = state[HEADING] + 2 * u;
    next[RATE] = state[RATE];
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    double u = state[RATE] * dt / 2;
    double cos = Math.cos(state[HEADING] + u);
    double sin = Math.sin(state[HEADING] + u);
    double along = dt * TurnArc.along(u);
    double way = state[SPEED] * along;
    double bend = state[SPEED] * dt * TurnArc.alongDerivative(u);
    place(jacobian, 0, along * cos, -way * sin, dt / 2 * (bend * cos - way * sin));
    place(jacobian, 1, along * sin, way * cos, dt / 2 * (bend * sin + way * cos));
    for (int i = 0; i < DIMENSION; i++) {
      jacobian[i * (DIMENSION + 1)] = 1;
    }
    jacobian[HEADING * DIMENSION + RATE] = dt;
  }

  private static void place(
      double[] jacobian, int row, double bySpeed, double byHeading, double byRate) {
    jacobian[row * DIMENSION + SPEED] = bySpeed;
    jacobian[row * DIMENSION + HEADING] = byHeading;
    jacobian[row * DIMENSION + RATE] = byRate;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    double course = state[HEADING] + state[RATE] * dt / 2;
    double cos = Math.cos(course);
    double sin = Math.sin(course);
    double speed = state[SPEED];
    double along = accelerationDensity * WhiteNoise.covariance(1, 0, 0, dt);
    double across = turnDensity * speed * speed * WhiteNoise.covariance(2, 0, 0, dt);
    set(covariance, 0, 0, cos * cos * along + sin * sin * across);
    set(covariance, 0, 1, cos * sin * (along - across));
    set(covariance, 1, 1, sin * sin * along + cos * cos * across);
    // Place with speed, with heading and with turn rate.
    double withSpeed = accelerationDensity * WhiteNoise.covariance(1, 0, 1, dt);
    vector(covariance, SPEED, cos * withSpeed, sin * withSpeed);
    for (int i = 1; i <= 2; i++) {
      double mixed = turnDensity * speed * WhiteNoise.covariance(2, 0, i, dt);
      vector(covariance, SPEED + i, -sin * mixed, cos * mixed);
    }
    set(covariance, SPEED, SPEED, accelerationDensity * dt);
    set(covariance, HEADING, HEADING, turnDensity * WhiteNoise.covariance(1, 0, 0, dt));
    set(covariance, HEADING, RATE, turnDensity * WhiteNoise.covariance(1, 0, 1, dt));
    set(covariance, RATE, RATE, turnDensity * dt);
  }

  private static void vector(double[] covariance, int column, double x, double y) {
    set(covariance, 0, column, x);
    set(covariance, 1, column, y);
  }

  private static void set(double[] covariance, int row, int column, double value) {
    covariance[row * DIMENSION + column] = value;
    covariance[column * DIMENSION + row] = value;
  }
}

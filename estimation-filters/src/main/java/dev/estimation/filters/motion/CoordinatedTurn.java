package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * A turn at constant speed and turn rate, disturbed by white acceleration and a turn rate that walks at random;
 * velocity in Cartesian components. State: x, y (m), velocity along x, along y (m/s), turn rate (rad/s), positive
 * from x to y. With u = turn rate dt, s = sin(u) / u, c = (1 - cos(u)) / u, which exist on a straight course as well,
 *
 * <pre>
 * x' = x + dt (s vx - c vy)        vx' = cos(u) vx - sin(u) vy
 * y' = y + dt (c vx + s vy)        vy' = sin(u) vx + cos(u) vy
 * </pre>
 *
 * <p>Q: on each axis q [[dt^3/3, dt^2/2], [dt^2/2, dt]], r dt on the turn rate, and nothing between them: what the
 * noise of the turn rate does to place and velocity within the step, r dt^3/3 speed^2 of velocity across,
 * is left out, as in the textbook. So Q(dt) composes over time only while that is little: {@link PolarTurn} has these terms.
 *
 * <p>Linear in place and velocity once the turn rate is given. <i>Immutable.</i> Allocates nothing. Source: Bar-Shalom,
 * Li and Kirubarajan 2001, section 11.7 (from memory).
 */
public final class CoordinatedTurn implements DifferentiableMotion {
  private static final int DIMENSION = 5;
  private static final FlatSpace SPACE = Space.reals(DIMENSION);
  private static final Structure LINEAR_BUT_FOR_RATE =
      Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3);

  private final double accelerationDensity;
  private final double turnDensity;

  /**
   * The model.
   *
   * @param accelerationDensity q, spectral density of the acceleration on each axis (m^2/s^3), finite and 0 or more
   * @param turnDensity r, spectral density of the turn acceleration (rad^2/s^3), finite and 0 or more
   */
  public CoordinatedTurn(double accelerationDensity, double turnDensity) {
    this.accelerationDensity =
        Parameters.notNegative("CoordinatedTurn accelerationDensity", accelerationDensity);
    this.turnDensity = Parameters.notNegative("CoordinatedTurn turnDensity", turnDensity);
  }

  @Override
  public FlatSpace stateSpace() {
    return SPACE;
  }

  /** {@return a structure that says: linear in all but the turn rate} */
  @Override
  public Structure structure() {
    return LINEAR_BUT_FOR_RATE;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    double vx = state[2];
    double vy = state[3];
    double u = state[4] * dt;
    double along = TurnArc.along(u);
    double across = TurnArc.across(u);
    double cos = Math.cos(u);
    double sin = Math.sin(u);
    next[0] = state[0] + dt * (along * vx - across * vy);
    next[1] = state[1] + dt * (across * vx + along * vy);
    next[2] = cos * vx - sin * vy;
    next[3] = sin * vx + cos * vy;
    next[4] = state[4];
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    double vx = state[2];
    double vy = state[3];
    double u = state[4] * dt;
    double cos = Math.cos(u);
    double sin = Math.sin(u);
    double along = dt * TurnArc.along(u);
    double across = dt * TurnArc.across(u);
    double alongRate = TurnArc.alongDerivative(u);
    double acrossRate = TurnArc.acrossDerivative(u);
    row(jacobian, 0, along, -across, dt * dt * (alongRate * vx - acrossRate * vy));
    row(jacobian, 1, across, along, dt * dt * (acrossRate * vx + alongRate * vy));
    row(jacobian, 2, cos, -sin, -dt * (sin * vx + cos * vy));
    row(jacobian, 3, sin, cos, dt * (cos * vx - sin * vy));
    jacobian[0] = 1;
    jacobian[DIMENSION + 1] = 1;
    jacobian[DIMENSION * DIMENSION - 1] = 1;
  }

  private static void row(double[] jacobian, int row, double byX, double byY, double byTurnRate) {
    jacobian[row * DIMENSION + 2] = byX;
    jacobian[row * DIMENSION + 3] = byY;
    jacobian[row * DIMENSION + 4] = byTurnRate;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    double mixed = accelerationDensity * dt * dt / 2;
    for (int axis = 0; axis < 2; axis++) {
      int place = axis * (DIMENSION + 1);
      int velocity = (axis + 2) * (DIMENSION + 1);
      covariance[place] = accelerationDensity * dt * dt * dt / 3;
      covariance[velocity] = accelerationDensity * dt;
      covariance[place + 2] = mixed;
      covariance[velocity - 2] = mixed;
    }
    covariance[DIMENSION * DIMENSION - 1] = turnDensity * dt;
  }
}

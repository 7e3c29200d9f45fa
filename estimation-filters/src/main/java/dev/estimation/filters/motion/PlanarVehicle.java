package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;

/**
 * A vehicle in the plane that holds its commanded speed and yaw rate over each step, both disturbed by white noise, and
 * so drives an arc. State: x, y (m), heading (rad, from x towards y). Control: speed (m/s), yaw rate (rad/s). Noise:
 * n, added to the two controls. With v = speed + n_0 and u = (yaw rate + n_1) dt / 2, half the angle turned,
 *
 * <pre>
 * x' = x + v dt sin(u)/u cos(heading + u)
 * y' = y + v dt sin(u)/u sin(heading + u)        heading' = heading + 2 u
 * </pre>
 *
 * <p>Noise held over the step has the variance density / dt. So the variance of place across a straight course is (yaw rate
 * density) v^2 dt^3 / 4, and would be that / 3 if the noise were white within the step: keep steps at those of the odometry, and
 * the growth over many is right. Linear in place and in the noise of the speed once heading
 * and the noise of the yaw rate are given. <i>Immutable.</i> Allocates nothing. Source: Thrun, Burgard and Fox 2005,
 * <i>Probabilistic Robotics</i>, section 5.3 (from memory), the arc written by its chord.
 */
public final class PlanarVehicle implements DifferentiableNoiseDrivenMotion {
  private static final FlatSpace SPACE = Space.reals(2).and(Space.angles(1));

  /** Place and noise of the speed; bent by heading and noise of the yaw rate. */
  private static final Structure LINEAR = Structure.UNKNOWN.withLinearInputs(0, 1, 3);

  private final double speedDensity;
  private final double yawDensity;

  /**
   * The model.
   *
   * @param speedDensity spectral density of the noise of the speed (m^2/s), finite and 0 or more
   * @param yawDensity spectral density of the noise of the yaw rate (rad^2/s), finite and 0 or more
   */
  public PlanarVehicle(double speedDensity, double yawDensity) {
    this.speedDensity = Parameters.notNegative("PlanarVehicle speedDensity", speedDensity);
    this.yawDensity = Parameters.notNegative("PlanarVehicle yawDensity", yawDensity);
  }

  @Override
  public FlatSpace stateSpace() {
    return SPACE;
  }

  @Override
  public int controlDimension() {
    return 2;
  }

  @Override
  public int noiseDimension() {
    return 2;
  }

  @Override
  public Structure structure() {
    return LINEAR;
  }

  @Override
  public void move(
      double[] state, double[] noise, double[] control, double time, double dt, double[] next) {
    double speed = control[0] + noise[0];
    double u = (control[1] + noise[1]) * dt / 2;
    double chord = speed * dt * TurnArc.along(u);
    next[0] = state[0] + chord * Math.cos(state[2] + u);
    next[1] = state[1] + chord * Math.sin(state[2] + u);
    next[2] = state[2] + 2 * u;
  }

  @Override
  public void moveJacobians(
      double[] state,
      double[] noise,
      double[] control,
      double time,
      double dt,
      double[] byState,
      double[] byNoise) {
    double speed = control[0] + noise[0];
    double u = (control[1] + noise[1]) * dt / 2;
    double cos = Math.cos(state[2] + u);
    double sin = Math.sin(state[2] + u);
    double along = TurnArc.along(u);
    double alongRate = TurnArc.alongDerivative(u);
    double chord = speed * dt * along;
    double byTurn = speed * dt * dt / 2;
    byState[0] = 1;
    byState[2] = -chord * sin;
    byState[4] = 1;
    byState[5] = chord * cos;
    byState[8] = 1;
    byNoise[0] = dt * along * cos;
    byNoise[1] = byTurn * (alongRate * cos - along * sin);
    byNoise[2] = dt * along * sin;
    byNoise[3] = byTurn * (alongRate * sin + along * cos);
    byNoise[5] = dt;
  }

  @Override
  public void noiseCovariance(double[] control, double time, double dt, double[] covariance) {
    covariance[0] = speedDensity / dt;
    covariance[3] = yawDensity / dt;
  }
}

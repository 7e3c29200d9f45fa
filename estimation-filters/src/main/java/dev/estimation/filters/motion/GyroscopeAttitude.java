package dev.estimation.filters.motion;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * The attitude of a rigid body with rate gyroscopes that have a bias. State: unit quaternion q (w, x, y, z) that turns
 * vectors of the body into those of the world, bias b (rad/s). Control: the readings of the three gyroscopes (rad/s), in
 * the body, held over the step. With p = (reading - b) dt,
 *
 * <pre>
 * q' = q * exp(p)      F = [exp(-p)  -dt J(p)]      J(p) = I - (1 - cos t)/t^2 [p]x + (t - sin t)/t^3 [p]x^2,
 * b' = b                   [0         I      ]      t = |p|
 * </pre>
 *
 * <p>Differences, F and Q are those of {@link Space#unitQuaternion()}: a rotation vector in the body, 3 numbers, then
 * the bias. Q = diag(n dt, n dt, n dt, r dt, r dt, r dt). What the bias wanders within a step reaches the attitude
 * from the next step on; terms r dt^3/3 and -r dt^2/2 are left out, so at rates of 50 Hz and more this is exact enough, and a long
 * time without readings is better taken in several steps (common practice).
 *
 * <p>Nonlinear in all. Rotations of 1e155 rad and more in a step give NaN. <i>Immutable.</i> Allocates nothing. Source:
 * Sola 2017, <i>Quaternion kinematics for the error-state Kalman filter</i> (from memory).
 */
public final class GyroscopeAttitude implements DifferentiableMotion {
  private static final Space ROTATION = Space.unitQuaternion();
  private static final Space SPACE = ROTATION.and(Space.reals(3));
  private static final int DIMENSION = 6;

  private final double angleDensity;
  private final double biasDensity;

  /**
   * The model.
   *
   * @param angleDensity n, spectral density of the noise of the readings (rad^2/s), the square of the angle random walk
   *     of a data sheet; finite and 0 or more
   * @param biasDensity r, spectral density of the rate of the bias (rad^2/s^3), finite and 0 or more
   */
  public GyroscopeAttitude(double angleDensity, double biasDensity) {
    this.angleDensity = Parameters.notNegative("GyroscopeAttitude angleDensity", angleDensity);
    this.biasDensity = Parameters.notNegative("GyroscopeAttitude biasDensity", biasDensity);
  }

  @Override
  public Space stateSpace() {
    return SPACE;
  }

  @Override
  public int controlDimension() {
    return 3;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    for (int i = 0; i < 3; i++) {
      next[4 + i] = (control[i] - state[4 + i]) * dt;
    }
    ROTATION.displace(state, next, 4, next, 0);
    System.arraycopy(state, 4, next, 4, 3);
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    double x = (control[0] - state[4]) * dt;
    double y = (control[1] - state[5]) * dt;
    double z = (control[2] - state[6]) * dt;
    double squared = x * x + y * y + z * z;
    double t = Math.sqrt(squared);
    double half = TurnArc.along(t / 2);
    double sine = TurnArc.along(t);
    double versine = half * half / 2;
    double rest = squared > 1 ? (1 - sine) / squared : sineRest(squared);
    block(jacobian, 0, 1, -sine, versine, x, y, z);
    block(jacobian, 3, -dt, dt * versine, -dt * rest, x, y, z);
    for (int i = 3; i < DIMENSION; i++) {
      jacobian[i * (DIMENSION + 1)] = 1;
    }
  }

  /** (t - sin t) / t^3 by its series, up to t = 1. */
  private static double sineRest(double squared) {
    double sum = 0;
    double term = 1.0 / 6;
    for (int n = 4; n < 24; n += 2) {
      sum += term;
      term *= -squared / (n * (n + 1));
    }
    return sum;
  }

  /** The 3 x 3 block k I + l [p]x + m [p]x^2 in the upper rows, from a column on. */
  private static void block(
      double[] jacobian, int column, double k, double l, double m, double x, double y, double z) {
    double own = k - m * (x * x + y * y + z * z);
    int second = column + DIMENSION;
    int third = second + DIMENSION;
    jacobian[column] = own + m * x * x;
    jacobian[column + 1] = m * x * y - l * z;
    jacobian[column + 2] = m * x * z + l * y;
    jacobian[second] = m * x * y + l * z;
    jacobian[second + 1] = own + m * y * y;
    jacobian[second + 2] = m * y * z - l * x;
    jacobian[third] = m * x * z - l * y;
    jacobian[third + 1] = m * y * z + l * x;
    jacobian[third + 2] = own + m * z * z;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    for (int i = 0; i < 3; i++) {
      covariance[i * (DIMENSION + 1)] = angleDensity * dt;
      covariance[(3 + i) * (DIMENSION + 1)] = biasDensity * dt;
    }
  }
}

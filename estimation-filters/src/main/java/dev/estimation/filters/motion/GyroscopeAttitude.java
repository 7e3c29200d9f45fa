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
 * the bias. Q is the integral of the noise along the turn, through what the bias wanders within the step too:
 *
 * <pre>
 * Q = [n dt I + r dt^3 (I/3 + 2 c_5 [p]x^2)      C  ]     C = -r dt^2 (I/2 - c_3 [p]x + c_4 [p]x^2)
 *     [C'                                      r dt I]     c_k = 1/k! - t^2/(k + 2)! + t^4/(k + 4)! - ...
 * </pre>
 *
 * <p>So while the reading less the bias stays what it is, Q composes over time: F(h) Q(h) F(h)' + Q(h) = Q(2 h).
 *
 * <p>Nonlinear in all. Rotations of 1e155 rad and more in a step give NaN. <i>Immutable.</i> Allocates nothing. Source:
 * Sola 2017, <i>Quaternion kinematics for the error-state Kalman filter</i> (from memory); Q integrated here in closed form.
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
    double versine = TurnSeries.sum(2, squared);
    block(jacobian, 0, 1, -TurnSeries.sum(1, squared), versine, x, y, z);
    block(jacobian, 3, -dt, dt * versine, -dt * TurnSeries.sum(3, squared), x, y, z);
    for (int i = 3; i < DIMENSION; i++) {
      jacobian[i * (DIMENSION + 1)] = 1;
    }
  }

  /** The 3 x 3 block k I + l [p]x + m [p]x^2 in the upper rows, from a column on. */
  private static void block(
      double[] matrix, int column, double k, double l, double m, double x, double y, double z) {
    double own = k - m * (x * x + y * y + z * z);
    int second = column + DIMENSION;
    int third = second + DIMENSION;
    matrix[column] = own + m * x * x;
    matrix[column + 1] = m * x * y - l * z;
    matrix[column + 2] = m * x * z + l * y;
    matrix[second] = m * x * y + l * z;
    matrix[second + 1] = own + m * y * y;
    matrix[second + 2] = m * y * z - l * x;
    matrix[third] = m * x * z - l * y;
    matrix[third + 1] = m * y * z + l * x;
    matrix[third + 2] = own + m * z * z;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    double x = (control[0] - state[4]) * dt;
    double y = (control[1] - state[5]) * dt;
    double z = (control[2] - state[6]) * dt;
    double squared = x * x + y * y + z * z;
    double mixed = -biasDensity * dt * dt;
    double wandered = -mixed * dt;
    double bent = 2 * wandered * TurnSeries.sum(5, squared);
    block(covariance, 0, angleDensity * dt + wandered / 3, 0, bent, x, y, z);
    double skew = -mixed * TurnSeries.sum(3, squared);
    block(covariance, 3, mixed / 2, skew, mixed * TurnSeries.sum(4, squared), x, y, z);
    for (int i = 3; i < DIMENSION; i++) {
      for (int j = 0; j < 3; j++) {
        covariance[i * DIMENSION + j] = covariance[j * DIMENSION + i];
      }
      covariance[i * (DIMENSION + 1)] = biasDensity * dt;
    }
  }
}

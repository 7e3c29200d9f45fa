package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * The attitude of a body with rate gyroscopes: a unit quaternion that turns vectors of the body into those
 * of the world, and the bias of the gyroscopes (rad/s). None of the models allocates.
 */
public final class Attitude {
  /** Rotation and bias. */
  public static final Space SPACE = Space.unitQuaternion().and(Space.reals(3));

  private static final Space ROTATION = Space.unitQuaternion();

  private Attitude() {}

  /** Turns by the measured rates, which are the control, less the bias. */
  public record Gyroscopes(double rateDensity, double biasDensity) implements DifferentiableMotion {
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

    /** [exp(-p), -dt J(p); 0, I] with p the turn and J the right Jacobian of exp. */
    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      double x = (control[0] - state[4]) * dt;
      double y = (control[1] - state[5]) * dt;
      double z = (control[2] - state[6]) * dt;
      double t = Math.sqrt(x * x + y * y + z * z);
      // Series below 1e-4: the next terms are t^2 / 20 of the last, and smaller.
      double a = t < 1e-4 ? 1 : Math.sin(t) / t;
      double b = t < 1e-4 ? 0.5 : (1 - Math.cos(t)) / (t * t);
      double c = t < 1e-4 ? 1 / 6.0 : (t - Math.sin(t)) / (t * t * t);
      fill(jacobian, 0, 1, -a, b, x, y, z);
      fill(jacobian, 3, -dt, dt * b, -dt * c, x, y, z);
      for (int i = 3; i < 6; i++) {
        jacobian[i * 7] = 1;
      }
    }

    /** The 3 x 3 block k I + l [p]x + m [p]x^2 at a column. */
    private static void fill(
        double[] jacobian, int column, double k, double l, double m, double x, double y, double z) {
      double own = k - m * (x * x + y * y + z * z);
      jacobian[column] = own + m * x * x;
      jacobian[column + 1] = m * x * y - l * z;
      jacobian[column + 2] = m * x * z + l * y;
      jacobian[column + 6] = m * x * y + l * z;
      jacobian[column + 7] = own + m * y * y;
      jacobian[column + 8] = m * y * z - l * x;
      jacobian[column + 12] = m * x * z - l * y;
      jacobian[column + 13] = m * y * z + l * x;
      jacobian[column + 14] = own + m * z * z;
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      for (int i = 0; i < 3; i++) {
        covariance[i * 7] = rateDensity * rateDensity * dt;
        covariance[(3 + i) * 7] = biasDensity * biasDensity * dt;
      }
    }
  }

  /** The direction in the body of a vector of the world that is given: h = R(q)' u. */
  public record Direction(double deviation) implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(3);
    }

    @Override
    public int givenDimension() {
      return 3;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      double w = state[0];
      double x = state[1];
      double y = state[2];
      double z = state[3];
      double a = given[0];
      double b = given[1];
      double c = given[2];
      measurement[0] =
          (w * w + x * x - y * y - z * z) * a + 2 * ((x * y + w * z) * b + (x * z - w * y) * c);
      measurement[1] =
          (w * w - x * x + y * y - z * z) * b + 2 * ((x * y - w * z) * a + (y * z + w * x) * c);
      measurement[2] =
          (w * w - x * x - y * y + z * z) * c + 2 * ((x * z + w * y) * a + (y * z - w * x) * b);
    }

    /** [h]x, formed with h in the first column's place. */
    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      measure(state, given, jacobian);
      double a = jacobian[0];
      double b = jacobian[1];
      double c = jacobian[2];
      int columns = jacobian.length / 3;
      jacobian[0] = 0;
      jacobian[1] = -c;
      jacobian[2] = b;
      jacobian[columns] = c;
      jacobian[columns + 2] = -a;
      jacobian[2 * columns] = -b;
      jacobian[2 * columns + 1] = a;
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      for (int i = 0; i < 3; i++) {
        covariance[i * 4] = deviation * deviation;
      }
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1, 2);
    }
  }

  /** The attitude itself, as a star camera gives it; of any sign. */
  public record Camera(double deviation) implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return ROTATION;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      for (int i = 0; i < 4; i++) {
        measurement[i] = state[1] > 0 ? state[i] : -state[i];
      }
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      int columns = jacobian.length / 3;
      for (int i = 0; i < 3; i++) {
        jacobian[i * columns + i] = 1;
      }
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      for (int i = 0; i < 3; i++) {
        covariance[i * 4] = deviation * deviation;
      }
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1, 2);
    }
  }
}

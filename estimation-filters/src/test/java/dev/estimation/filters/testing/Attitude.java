package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
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

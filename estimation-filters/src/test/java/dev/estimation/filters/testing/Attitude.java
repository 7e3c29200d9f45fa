package dev.estimation.filters.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.KnownVector;

/**
 * The attitude of a body with rate gyroscopes: a unit quaternion that turns vectors of the body into those
 * of the world, and the bias of the gyroscopes (rad/s). None of the models allocates.
 */
public final class Attitude {
  /** Rotation and bias. */
  public static final Space SPACE = Space.unitQuaternion().and(Space.reals(3));

  private static final Space ROTATION = Space.unitQuaternion();

  private Attitude() {}

  /** {@return the sensor of a vector of the world that is given, as seen in the body} */
  public static KnownVector knownVector(double deviation) {
    return new KnownVector(Components.of(0, 1, 2, 3), deviation);
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

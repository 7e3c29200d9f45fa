package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * A known vector of the world as seen in the body: h = R(q)' u, with R(q) the rotation that turns vectors of the body into
 * those of the world. The Earth's magnetic field; the direction to the sun or a star; the up direction by an accelerometer
 * that is not accelerated (at rest it measures the push against gravity, upwards).
 *
 * <p>Given: u along the axes of the world, 3 numbers. Measurement and noise are in the unit of u: none for a direction of
 * length 1, of which the noise is then the angle (rad). The noise is the same along the three axes, along u too,
 * where a direction that was scaled to length 1 has none: for attitudes known to a small angle that part tells next to nothing.
 *
 * <p>The derivative by a turn of the body is [h]x, the matrix of the cross product with h. Defined everywhere; a turn about u cannot be
 * seen. Source: Sola 2017, <i>Quaternion kinematics for the error-state Kalman filter</i>, section 4 (from memory). <i>Immutable.</i>
 */
public final class KnownVector extends ReadySensor {
  private static final FlatSpace SPACE = Space.reals(3);
  private static final String NAME = "KnownVector";

  private final int start;
  private final int column;

  /**
   * The sensor.
   *
   * @param attitude the 4 components of a unit quaternion (w, x, y, z), one after the other
   * @param deviation of the noise along each axis, in the unit of the vector; finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public KnownVector(Components attitude, double deviation) {
    super(
        SPACE,
        3,
        SensorSetUp.structure(columns(attitude), new int[0], NAME),
        variances(SensorSetUp.variance(deviation, "deviation", NAME)));
    this.start = attitude.index(0);
    this.column = attitude.column(0);
  }

  private static double[] variances(double variance) {
    return new double[] {variance, variance, variance};
  }

  /** The three columns of the attitude. */
  private static int[] columns(Components attitude) {
    attitude.requireCount(4, "an attitude", "sensor model " + NAME);
    for (int i = 1; i < 4; i++) {
      if (attitude.index(i) != attitude.index(0) + i) {
        throw new IllegalArgumentException(
            "an attitude must have 4 components one after the other, got " + attitude
                + " (sensor model " + NAME + ")");
      }
    }
    return Arrays.copyOf(attitude.columns(), 3);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    double w = state[start];
    double x = state[start + 1];
    double y = state[start + 2];
    double z = state[start + 3];
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

  /** [h]x, formed with h in the first three places. */
  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    measure(state, given, jacobian);
    double a = jacobian[0];
    double b = jacobian[1];
    double c = jacobian[2];
    jacobian[0] = 0;
    jacobian[1] = 0;
    jacobian[2] = 0;
    int columns = jacobian.length / 3;
    jacobian[column + 1] = -c;
    jacobian[column + 2] = b;
    jacobian[columns + column] = c;
    jacobian[columns + column + 2] = -a;
    jacobian[2 * columns + column] = -b;
    jacobian[2 * columns + column + 1] = a;
  }
}

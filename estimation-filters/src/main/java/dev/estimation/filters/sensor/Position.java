package dev.estimation.filters.sensor;

import dev.estimation.core.space.Space;

/**
 * Components of the state as they are, with independent errors: a position (m), a velocity (m/s), a depth. Angles are for
 * {@link Heading}, whose differences go the short way round.
 *
 * <p>Nothing is given. Linear in all that it reads: no matching draws points for it. <i>Immutable.</i>
 */
public final class Position extends ReadySensor {
  private static final String NAME = "Position";

  private final int[] indices;
  private final int[] columns;

  /**
   * The sensor.
   *
   * @param position 1 component or more, real numbers
   * @param deviations of the noise, one for each component, in its unit; finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public Position(Components position, double... deviations) {
    super(
        Space.reals(deviations.length),
        0,
        SensorSetUp.structure(new int[0], position.columns(), NAME),
        variances(deviations));
    position.requireCount(
        deviations.length,
        "a position with " + deviations.length + " deviations",
        "sensor model " + NAME);
    this.indices = position.indices();
    this.columns = position.columns();
  }

  private static double[] variances(double[] deviations) {
    double[] variances = new double[deviations.length];
    for (int i = 0; i < deviations.length; i++) {
      variances[i] = SensorSetUp.variance(deviations[i], "deviations[" + i + "]", NAME);
    }
    return variances;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    for (int i = 0; i < indices.length; i++) {
      measurement[i] = state[indices[i]];
    }
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    int width = jacobian.length / columns.length;
    for (int i = 0; i < columns.length; i++) {
      jacobian[i * width + columns[i]] = 1;
    }
  }
}

package dev.estimation.filters.sensor;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * Components of the state as they are, with independent errors: a position (m), a velocity (m/s), a depth. Angles are for
 * {@link Heading}, whose differences go the short way round.
 *
 * <p>Nothing is given. Linear in all that it reads: no matching draws points for it. <i>Immutable.</i>
 */
public final class Position implements DifferentiableSensor {
  private static final String NAME = "Position";

  private final int[] indices;
  private final int[] columns;
  private final double[] variances;
  private final FlatSpace space;
  private final Structure structure;

  /**
   * The sensor.
   *
   * @param position 1 component or more, real numbers
   * @param deviations of the noise, one for each component, in its unit; finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public Position(Components position, double... deviations) {
    position.requireCount(
        deviations.length,
        "a position with " + deviations.length + " deviations",
        "sensor model " + NAME);
    this.indices = new int[deviations.length];
    this.variances = new double[deviations.length];
    for (int i = 0; i < deviations.length; i++) {
      indices[i] = position.index(i);
      variances[i] = SensorSetUp.variance(deviations[i], "deviations[" + i + "]", NAME);
    }
    this.columns = position.columns();
    this.space = Space.reals(deviations.length);
    this.structure = SensorSetUp.structure(new int[0], columns, NAME);
  }

  @Override
  public FlatSpace measurementSpace() {
    return space;
  }

  @Override
  public Structure structure() {
    return structure;
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

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    for (int i = 0; i < variances.length; i++) {
      covariance[i * (variances.length + 1)] = variances[i];
    }
  }
}

package dev.estimation.filters.sensor;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * An angle of the state as it is (rad): the heading by a compass. Zero and sense are those that the state has; differences
 * go the short way round, however many turns the state has made.
 *
 * <p>Nothing is given. Linear in the heading. <i>Immutable.</i>
 */
public final class Heading implements DifferentiableSensor {
  private static final FlatSpace SPACE = Space.angles(1);
  private static final String NAME = "Heading";

  private final int index;
  private final int column;
  private final double variance;
  private final Structure structure;

  /**
   * The sensor.
   *
   * @param heading 1 component (rad)
   * @param deviation of the noise (rad), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public Heading(Components heading, double deviation) {
    heading.requireCount(1, "a heading", "sensor model " + NAME);
    this.index = heading.index(0);
    this.column = heading.column(0);
    this.variance = SensorSetUp.variance(deviation, "heading deviation (rad)", NAME);
    this.structure = SensorSetUp.structure(new int[0], heading.columns(), NAME);
  }

  @Override
  public FlatSpace measurementSpace() {
    return SPACE;
  }

  @Override
  public Structure structure() {
    return structure;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = state[index];
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    jacobian[column] = 1;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    covariance[0] = variance;
  }
}

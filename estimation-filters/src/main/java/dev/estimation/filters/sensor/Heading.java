package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;

/**
 * An angle of the state as it is (rad): the heading by a compass. Zero and sense are those that the state has; differences
 * go the short way round, however many turns the state has made.
 *
 * <p>Nothing is given. Linear in the heading. <i>Immutable.</i>
 */
public final class Heading extends ReadySensor {
  private static final FlatSpace SPACE = Space.angles(1);
  private static final String NAME = "Heading";

  private final int index;
  private final int column;

  /**
   * The sensor.
   *
   * @param heading 1 component (rad)
   * @param deviation of the noise (rad), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public Heading(Components heading, double deviation) {
    super(
        SPACE,
        0,
        SensorSetUp.structure(new int[0], heading.columns(), NAME),
        SensorSetUp.variance(deviation, "heading deviation (rad)", NAME));
    heading.requireCount(1, "a heading", "sensor model " + NAME);
    this.index = heading.index(0);
    this.column = heading.column(0);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = state[index];
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    jacobian[column] = 1;
  }
}

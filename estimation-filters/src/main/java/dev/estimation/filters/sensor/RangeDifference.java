package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;

/**
 * How much further it is to one place than to another (m): |d_1| - |d_2|. A difference of arrival times, times the
 * speed of the wave.
 *
 * <p>Given: the first place, then the second, 2 or 3 numbers each (m). Differences to the same second place share the error of its
 * arrival time; this sensor takes each with noise of its own. At either place derivatives are NaN, and an update by
 * linearisation is refused with a status. <i>Immutable.</i>
 */
public final class RangeDifference extends ReadySensor {
  private static final FlatSpace SPACE = Space.reals(1);
  private static final String NAME = "RangeDifference";

  private final Sight sight;

  /**
   * The sensor.
   *
   * @param sight in the plane or in space, without a heading; its direction does not matter
   * @param deviation of the noise (m), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public RangeDifference(Sight sight, double deviation) {
    super(
        SPACE,
        2 * sight.requireNoHeading(NAME).width(),
        sight.structure(NAME),
        SensorSetUp.variance(deviation, "range difference deviation (m)", NAME));
    this.sight = sight;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = sight.distance(state, given, 0) - sight.distance(state, given, sight.width());
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    int at = sight.width();
    double first = sight.distance(state, given, 0);
    double second = sight.distance(state, given, at);
    sight
        .columns()
        .fillRow(
            jacobian,
            0,
            sight.first(state, given, 0) / first - sight.first(state, given, at) / second,
            sight.second(state, given, 0) / first - sight.second(state, given, at) / second,
            sight.third(state, given, 0) / first - sight.third(state, given, at) / second);
  }
}

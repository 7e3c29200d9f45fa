package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;

/**
 * How fast a pseudorange grows (m/s): the range rate plus the drift of the receiver's clock, u'v + drift (see {@link
 * RangeRate}).
 *
 * <p>Given: the place of the satellite (m), then its velocity (m/s), in the axes of the state; the drift of the satellite's
 * clock is taken off the measurement before. Linear in velocity and drift. At distance 0 measurement and derivatives are NaN, and
 * the update is refused with a status. <i>Immutable.</i>
 */
public final class PseudorangeRate extends ReadySensor {
  private static final FlatSpace SPACE = Space.reals(1);
  private static final String NAME = "PseudorangeRate";

  private final RangeRate rate;
  private final int drift;
  private final int driftColumn;

  /**
   * The sensor.
   *
   * @param sight in the plane or in space, without a heading
   * @param velocity as many components as the position has (m/s), along the same axes
   * @param drift 1 component (m/s)
   * @param deviation of the noise (m/s), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public PseudorangeRate(Sight sight, Components velocity, Components drift, double deviation) {
    super(
        SPACE,
        2 * sight.requireNoHeading(NAME).width(),
        SensorSetUp.structure(
            sight.position().columns(),
            SensorSetUp.join(velocity.columns(), drift.columns()),
            NAME),
        SensorSetUp.variance(deviation, "range rate deviation (m/s)", NAME));
    drift.requireCount(1, "a drift", "sensor model " + NAME);
    this.rate = new RangeRate(sight, velocity, deviation);
    this.drift = drift.index(0);
    this.driftColumn = drift.column(0);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    rate.measure(state, given, measurement);
    measurement[0] += state[drift];
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    rate.measureJacobian(state, given, jacobian);
    jacobian[driftColumn] = 1;
  }
}

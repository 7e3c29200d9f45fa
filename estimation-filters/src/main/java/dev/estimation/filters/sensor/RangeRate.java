package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;

/**
 * How fast a distance grows (m/s): u'v, u = d / |d| the direction of the sight and v the velocity of what is seen less that
 * of the observer. Positive when they part. A Doppler shift of f out of a carrier f_0 is -c f / f_0 one way, half of that
 * for an echo.
 *
 * <p>Given: the place (m), then its velocity (m/s), 2 or 3 numbers each; zeros for a station at rest. Linear in the velocity of
 * the state. The derivative by d is (v - (u'v) u) / |d|. At a known height the state does not climb. At distance 0 measurement and
 * derivatives are NaN, and the update is refused with a status. <i>Immutable.</i>
 */
public final class RangeRate extends ReadySensor {
  private static final FlatSpace SPACE = Space.reals(1);
  private static final String NAME = "RangeRate";

  private final Sight sight;
  private final Sight motion;

  /**
   * The sensor.
   *
   * @param sight in the plane or in space, without a heading
   * @param velocity as many components as the position has (m/s), along the same axes
   * @param deviation of the noise (m/s), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public RangeRate(Sight sight, Components velocity, double deviation) {
    super(
        SPACE,
        2 * sight.requireNoHeading(NAME).width(),
        SensorSetUp.structure(sight.position().columns(), velocity.columns(), NAME),
        SensorSetUp.variance(deviation, "range rate deviation (m/s)", NAME));
    this.sight = sight;
    this.motion = sight.ofVelocity(velocity, NAME);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    int at = sight.width();
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double dz = sight.third(state, given, 0);
    double along = dx * motion.first(state, given, at)
        + dy * motion.second(state, given, at)
        + dz * motion.third(state, given, at);
    measurement[0] = along / Math.sqrt(dx * dx + dy * dy + dz * dz);
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    int at = sight.width();
    double range = sight.distance(state, given, 0);
    double ux = sight.first(state, given, 0) / range;
    double uy = sight.second(state, given, 0) / range;
    double uz = sight.third(state, given, 0) / range;
    double vx = motion.first(state, given, at);
    double vy = motion.second(state, given, at);
    double vz = motion.third(state, given, at);
    double rate = ux * vx + uy * vy + uz * vz;
    sight
        .columns()
        .fillRow(
            jacobian,
            0,
            (vx - rate * ux) / range,
            (vy - rate * uy) / range,
            (vz - rate * uz) / range);
    motion.columns().fillRow(jacobian, 0, ux, uy, uz);
  }
}

package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/**
 * A distance (m): |d|, d the sight, in the plane or in space.
 *
 * <p>Given: the place, 2 or 3 numbers (m). Derivatives: u = d / |d| and (I - u u') / |d|. At distance 0 the measurement
 * is 0 and the derivatives are NaN, so that an update by linearisation is refused with a status. <i>Immutable.</i>
 */
public final class Range extends ReadySensor implements TwiceDifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1);
  private static final String NAME = "Range";

  private final Sight sight;

  /**
   * The sensor.
   *
   * @param sight in the plane or in space, without a heading
   * @param deviation of the noise (m), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public Range(Sight sight, double deviation) {
    super(
        SPACE,
        sight.requireNoHeading(NAME).width(),
        sight.structure(NAME),
        SensorSetUp.variance(deviation, "range deviation (m)", NAME));
    this.sight = sight;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = sight.distance(state, given, 0);
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double dz = sight.third(state, given, 0);
    double range = Math.sqrt(dx * dx + dy * dy + dz * dz);
    sight.columns().fillRow(jacobian, 0, dx / range, dy / range, dz / range);
  }

  @Override
  public void measureHessian(double[] state, double[] given, double[] hessians) {
    fillHessian(sight, state, given, hessians, SensorSetUp.hessianColumns(hessians, 1));
  }

  /** Fills the first of some Hessians. */
  static void fillHessian(
      Sight sight, double[] state, double[] given, double[] hessians, int columns) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double dz = sight.third(state, given, 0);
    double range = Math.sqrt(dx * dx + dy * dy + dz * dz);
    double ux = dx / range;
    double uy = dy / range;
    double uz = dz / range;
    sight
        .columns()
        .fillPlane(
            hessians,
            0,
            columns,
            (uy * uy + uz * uz) / range,
            -ux * uy / range,
            (ux * ux + uz * uz) / range);
    sight
        .columns()
        .fillThird(
            hessians, 0, columns, -ux * uz / range, -uy * uz / range, (ux * ux + uy * uy) / range);
  }
}

package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/**
 * A distance (m) and a direction (rad) in the plane, with independent errors: what a {@link Range} and a {@link Bearing}
 * of the same sight measure, in one.
 *
 * <p>Given: the place, 2 numbers (m), and the heading (rad) if the sight says that it is given. Linear in a heading of the
 * state. At distance 0 there is no bearing: measurement and derivatives are NaN, and the update is refused with a status.
 * <i>Immutable.</i>
 */
public final class RangeAndBearing extends ReadySensor implements TwiceDifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1).and(Space.angles(1));
  private static final String NAME = "RangeAndBearing";

  private final Sight sight;

  /**
   * The sensor.
   *
   * @param sight in the plane
   * @param rangeDeviation of the noise (m), finite, above 0
   * @param bearingDeviation of the noise (rad), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public RangeAndBearing(Sight sight, double rangeDeviation, double bearingDeviation) {
    super(
        SPACE,
        sight.requireWidth(2, NAME).givenDimension(),
        sight.structure(NAME),
        SensorSetUp.variance(rangeDeviation, "range deviation (m)", NAME),
        SensorSetUp.variance(bearingDeviation, "bearing deviation (rad)", NAME));
    this.sight = sight;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    measurement[0] = Math.sqrt(dx * dx + dy * dy);
    measurement[1] = sight.bearing(state, given, dx, dy);
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double square = dx * dx + dy * dy;
    double range = Math.sqrt(square);
    int columns = jacobian.length / 2;
    sight.columns().fillRow(jacobian, 0, dx / range, dy / range, 0);
    sight.columns().fillRow(jacobian, columns, -dy / square, dx / square, 0);
    sight.columns().fillHeading(jacobian, columns);
  }

  @Override
  public void measureHessian(double[] state, double[] given, double[] hessians) {
    int columns = SensorSetUp.hessianColumns(hessians, 2);
    Range.fillHessian(sight, state, given, hessians, columns);
    Bearing.fillHessian(sight, state, given, hessians, columns * columns, columns);
  }
}

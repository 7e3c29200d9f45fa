package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/**
 * A direction in the plane (rad): atan2(d_2, d_1), less the heading if the sight has one. It is zero along the
 * first component of the position and grows towards the second; any number of turns may be on it, since differences go
 * the short way round.
 *
 * <p>Given: the place, 2 numbers (m), and the heading (rad) if the sight says that it is given. Linear in a heading of the
 * state. At distance 0 there is no bearing: measurement and derivatives are NaN, and the update is refused with a status.
 * <i>Immutable.</i>
 */
public final class Bearing extends ReadySensor implements TwiceDifferentiableSensor {
  private static final FlatSpace SPACE = Space.angles(1);
  private static final String NAME = "Bearing";

  private final Sight sight;

  /**
   * The sensor.
   *
   * @param sight in the plane
   * @param deviation of the noise (rad), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public Bearing(Sight sight, double deviation) {
    super(
        SPACE,
        sight.requireWidth(2, NAME).givenDimension(),
        sight.structure(NAME),
        SensorSetUp.variance(deviation, "bearing deviation (rad)", NAME));
    this.sight = sight;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] =
        sight.bearing(state, given, sight.first(state, given, 0), sight.second(state, given, 0));
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double square = dx * dx + dy * dy;
    sight.columns().fillRow(jacobian, 0, -dy / square, dx / square, 0);
    sight.columns().fillHeading(jacobian, 0);
  }

  @Override
  public void measureHessian(double[] state, double[] given, double[] hessians) {
    fillHessian(sight, state, given, hessians, 0, SensorSetUp.hessianColumns(hessians, 1));
  }

  /** Fills the one of some Hessians that begins at an index. */
  static void fillHessian(
      Sight sight, double[] state, double[] given, double[] hessians, int start, int columns) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double square = dx * dx + dy * dy;
    double ux = dx / square;
    double uy = dy / square;
    sight
        .columns()
        .fillPlane(hessians, start, columns, 2 * ux * uy, uy * uy - ux * ux, -2 * ux * uy);
  }
}

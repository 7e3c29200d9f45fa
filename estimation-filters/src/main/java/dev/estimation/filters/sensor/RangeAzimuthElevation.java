package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;

/**
 * A slant range (m), an azimuth (rad) and an elevation (rad), with independent errors: |d|, atan2(d_2, d_1) less the heading
 * if the sight has one, and atan2(d_3, sqrt(d_1^2 + d_2^2)).
 *
 * <p>The azimuth is zero along the first component of the position and grows towards the second; the elevation is that above
 * the plane of the two, towards the third. Components that stand in the state as east, north and up are named (north, east,
 * up) to have the azimuth of the compass. A heading turns about the third axis; roll and pitch of a platform are not
 * corrected.
 *
 * <p>Given: the place, 3 numbers (m), and the heading (rad) if the sight says that it is given. Linear in a heading of the
 * state. Straight overhead or below there is no azimuth: it and the derivatives of both angles are NaN, and the update is
 * refused with a status. <i>Immutable.</i>
 */
public final class RangeAzimuthElevation extends ReadySensor {
  private static final FlatSpace SPACE = Space.reals(1).and(Space.angles(2));
  private static final String NAME = "RangeAzimuthElevation";

  private final Sight sight;

  /**
   * The sensor.
   *
   * @param sight in space
   * @param rangeDeviation of the noise (m), finite, above 0
   * @param azimuthDeviation of the noise (rad), finite, above 0
   * @param elevationDeviation of the noise (rad), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public RangeAzimuthElevation(
      Sight sight, double rangeDeviation, double azimuthDeviation, double elevationDeviation) {
    super(
        SPACE,
        sight.requireWidth(3, NAME).givenDimension(),
        sight.structure(NAME),
        SensorSetUp.variance(rangeDeviation, "range deviation (m)", NAME),
        SensorSetUp.variance(azimuthDeviation, "azimuth deviation (rad)", NAME),
        SensorSetUp.variance(elevationDeviation, "elevation deviation (rad)", NAME));
    this.sight = sight;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double dz = sight.third(state, given, 0);
    double ground = dx * dx + dy * dy;
    measurement[0] = Math.sqrt(ground + dz * dz);
    measurement[1] = sight.bearing(state, given, dx, dy);
    measurement[2] = Math.atan2(dz, Math.sqrt(ground));
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    double dx = sight.first(state, given, 0);
    double dy = sight.second(state, given, 0);
    double dz = sight.third(state, given, 0);
    double groundSquare = dx * dx + dy * dy;
    double square = groundSquare + dz * dz;
    double ground = Math.sqrt(groundSquare);
    double range = Math.sqrt(square);
    double tilt = -dz / (square * ground);
    int columns = jacobian.length / 3;
    sight.columns().fillRow(jacobian, 0, dx / range, dy / range, dz / range);
    sight.columns().fillRow(jacobian, columns, -dy / groundSquare, dx / groundSquare, 0);
    sight.columns().fillHeading(jacobian, columns);
    sight.columns().fillRow(jacobian, 2 * columns, tilt * dx, tilt * dy, ground / square);
  }
}

package dev.estimation.benchmarks.cases.vessel;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * Range (m) and bearing (rad, from north to east) of a vessel as seen from the own ship. Given: own
 * ship's north and east (m). The state begins with north and east. At zero range there is no
 * bearing: the Jacobian is not finite. <i>Immutable.</i>
 */
final class ShipRadar implements DifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1).and(Space.angles(1));
  private static final Structure POSITION_ONLY = Structure.UNKNOWN.withActiveInputs(0, 1);

  private final double rangeDeviation;
  private final double bearingDeviation;

  /**
   * The sensor.
   *
   * @param rangeDeviation m
   * @param bearingDeviation rad
   */
  ShipRadar(double rangeDeviation, double bearingDeviation) {
    this.rangeDeviation = rangeDeviation;
    this.bearingDeviation = bearingDeviation;
  }

  @Override
  public FlatSpace measurementSpace() {
    return SPACE;
  }

  @Override
  public int givenDimension() {
    return 2;
  }

  @Override
  public void measure(double[] state, double[] ownShip, double[] measurement) {
    double north = state[0] - ownShip[0];
    double east = state[1] - ownShip[1];
    measurement[0] = Math.hypot(north, east);
    measurement[1] = Math.atan2(east, north);
  }

  @Override
  public void measureJacobian(double[] state, double[] ownShip, double[] jacobian) {
    double north = state[0] - ownShip[0];
    double east = state[1] - ownShip[1];
    double range = Math.hypot(north, east);
    int n = state.length;
    jacobian[0] = north / range;
    jacobian[1] = east / range;
    jacobian[n] = -east / range / range;
    jacobian[n + 1] = north / range / range;
  }

  @Override
  public void measurementNoise(double[] state, double[] ownShip, double[] covariance) {
    covariance[0] = rangeDeviation * rangeDeviation;
    covariance[3] = bearingDeviation * bearingDeviation;
  }

  @Override
  public Structure structure() {
    return POSITION_ONLY;
  }
}

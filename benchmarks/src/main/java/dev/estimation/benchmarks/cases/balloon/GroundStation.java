package dev.estimation.benchmarks.cases.balloon;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * Slant range (m), azimuth (rad, from north to east) and elevation (rad, above the horizon) of a
 * balloon as seen from a station at the origin. The state begins with east, north and up (m).
 * Straight above the station there is no azimuth: the Jacobian is not finite. <i>Immutable.</i>
 */
final class GroundStation implements DifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1).and(Space.angles(2));
  private static final Structure POSITION_ONLY = Structure.UNKNOWN.withActiveInputs(0, 1, 2);

  private final double rangeDeviation;
  private final double angleDeviation;

  /**
   * The sensor.
   *
   * @param rangeDeviation m
   * @param angleDeviation of both angles (rad)
   */
  GroundStation(double rangeDeviation, double angleDeviation) {
    this.rangeDeviation = rangeDeviation;
    this.angleDeviation = angleDeviation;
  }

  @Override
  public FlatSpace measurementSpace() {
    return SPACE;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    double ground = Math.hypot(state[0], state[1]);
    measurement[0] = Math.hypot(ground, state[2]);
    measurement[1] = Math.atan2(state[0], state[1]);
    measurement[2] = Math.atan2(state[2], ground);
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    double east = state[0];
    double north = state[1];
    double up = state[2];
    double ground = Math.hypot(east, north);
    double range = Math.hypot(ground, up);
    int n = state.length;
    jacobian[0] = east / range;
    jacobian[1] = north / range;
    jacobian[2] = up / range;
    jacobian[n] = north / ground / ground;
    jacobian[n + 1] = -east / ground / ground;
    jacobian[2 * n] = -up / range * (east / ground) / range;
    jacobian[2 * n + 1] = -up / range * (north / ground) / range;
    jacobian[2 * n + 2] = ground / range / range;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    covariance[0] = rangeDeviation * rangeDeviation;
    covariance[4] = angleDeviation * angleDeviation;
    covariance[8] = angleDeviation * angleDeviation;
  }

  @Override
  public Structure structure() {
    return POSITION_ONLY;
  }
}

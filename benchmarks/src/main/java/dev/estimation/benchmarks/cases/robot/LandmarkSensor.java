package dev.estimation.benchmarks.cases.robot;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * Range (m) and bearing (rad, counter-clockwise from the heading) of a landmark as seen from the
 * robot. Given: the landmark's x and y (m). State: x, y (m), heading (rad). At zero range there is
 * no bearing: the Jacobian is not finite. <i>Immutable.</i>
 */
final class LandmarkSensor implements DifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1).and(Space.angles(1));

  /** The heading is subtracted from the bearing. */
  private static final Structure LINEAR_IN_HEADING = Structure.UNKNOWN.withLinearInputs(2);

  private final double rangeDeviation;
  private final double bearingDeviation;

  /**
   * The sensor.
   *
   * @param rangeDeviation m
   * @param bearingDeviation rad
   */
  LandmarkSensor(double rangeDeviation, double bearingDeviation) {
    this.rangeDeviation = rangeDeviation;
    this.bearingDeviation = bearingDeviation;
  }

  @Override
  public FlatSpace measurementSpace() {
    return SPACE;
  }

  @Override
  public Structure structure() {
    return LINEAR_IN_HEADING;
  }

  @Override
  public int givenDimension() {
    return 2;
  }

  @Override
  public void measure(double[] state, double[] landmark, double[] measurement) {
    double x = landmark[0] - state[0];
    double y = landmark[1] - state[1];
    measurement[0] = Math.hypot(x, y);
    measurement[1] = Math.atan2(y, x) - state[2];
  }

  @Override
  public void measureJacobian(double[] state, double[] landmark, double[] jacobian) {
    double x = landmark[0] - state[0];
    double y = landmark[1] - state[1];
    double range = Math.hypot(x, y);
    jacobian[0] = -x / range;
    jacobian[1] = -y / range;
    jacobian[3] = y / range / range;
    jacobian[4] = -x / range / range;
    jacobian[5] = -1;
  }

  @Override
  public void measurementNoise(double[] state, double[] landmark, double[] covariance) {
    covariance[0] = rangeDeviation * rangeDeviation;
    covariance[3] = bearingDeviation * bearingDeviation;
  }
}

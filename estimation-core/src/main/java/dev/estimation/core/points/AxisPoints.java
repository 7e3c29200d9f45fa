package dev.estimation.core.points;

import java.util.Arrays;

/** Points on the axes at equal distance from the centre, of equal weight. */
final class AxisPoints {
  private AxisPoints() {}

  static UnitPoints of(
      int dimension, double distance, double centreMean, double centreCovariance, double weight) {
    UnitPoints.refuseAbove("a rule of points on " + dimension + " axes", 2.0 * dimension + 1);
    double[][] points = new double[2 * dimension][dimension];
    for (int axis = 0; axis < dimension; axis++) {
      points[axis][axis] = distance;
      points[dimension + axis][axis] = -distance;
    }
    double[] weights = new double[points.length];
    Arrays.fill(weights, weight);
    return UnitPoints.of(dimension, centreMean, centreCovariance, points, weights);
  }
}

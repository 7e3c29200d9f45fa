package dev.estimation.core.points;

import java.util.Arrays;

/** Points on the axes at equal distance from the centre, of equal weight. */
final class AxisPoints {
  private AxisPoints() {}

  static UnitPoints of(
      int dimension, double distance, double centreMean, double centreCovariance, double weight) {
    UnitPoints.refuseAbove("a rule of points on " + dimension + " axes", 2.0 * dimension + 1);
    double[][] points = new double[2 * dimension][dimension];
    fill(points, dimension, distance);
    double[] weights = new double[points.length];
    Arrays.fill(weights, weight);
    return UnitPoints.of(dimension, centreMean, centreCovariance, points, weights)
        .exactTo(degree(dimension, distance));
  }

  /** Fills the first 2 n points, which must be zero. */
  static void fill(double[][] points, int dimension, double distance) {
    for (int axis = 0; axis < dimension; axis++) {
      points[axis][axis] = distance;
      points[dimension + axis][axis] = -distance;
    }
  }

  /**
   * The degree of points at equal distance of which every one has its mirror image: 3, for fourth
   * powers or products of two squares fail. On one axis the fourth moment is the square of the
   * distance, and sqrt 3 makes it the normal one, 3: then the degree is 5.
   */
  static int degree(int dimension, double distance) {
    double rounding = 16 * Math.ulp(1.0);
    return dimension == 1 && Math.abs(distance * distance - 3) <= rounding ? 5 : 3;
  }
}

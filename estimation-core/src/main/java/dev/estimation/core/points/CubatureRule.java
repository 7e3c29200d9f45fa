package dev.estimation.core.points;

import java.util.Arrays;
import java.util.function.IntFunction;

/**
 * Cubature rules: fully symmetric points without parameters, of degree 3 or 5.
 *
 * <table>
 *   <caption>The rules in n dimensions</caption>
 *   <tr><th>rule</th><th>points: weight of each</th></tr>
 *   <tr><td>{@link #degreeThree()}</td><td>+-sqrt(n) e_i: 1 / (2 n)</td></tr>
 *   <tr><td>{@link #degreeFive()}</td><td>centre: 2 / (n + 2); +-sqrt(n + 2) e_i: (4 - n) / (2 (n +
 *     2)^2); sqrt((n + 2) / 2) (+-e_i +- e_j): 1 / (n + 2)^2</td></tr>
 *   <tr><td>{@link #mcNameeStenger()}</td><td>centre: 1 + (n^2 - 7 n) / 18; +-sqrt(3) e_i: (4 - n) /
 *     18; sqrt(3) (+-e_i +- e_j): 1 / 36</td></tr>
 * </table>
 *
 * <p>Means are exact for all polynomials to the degree. Those of degree 3 and, to 4 dimensions, those of
 * degree 5 never make a covariance indefinite; from 5 dimensions on the points on the axes of both have
 * negative weights. Points of the first two move out as the dimension grows, those of the third stay,
 * and its weights grow instead: rounding is multiplied by about 2 n^2 / 9, by 3 at most in the second.
 *
 * <p>Cost: 2 n + 1 evaluations for degree 3, one of them at the centre, from which deviations are taken,
 * and 2 n^2 + 1 for degree 5. <i>Immutable.</i> Source: Arasaratnam and Haykin 2009, <i>Cubature Kalman
 * filters</i>, IEEE Transactions on Automatic Control 54(6); Jia, Xin and Cheng 2013, <i>High-degree
 * cubature Kalman filter</i>, Automatica 49(2), after Stroud 1971, <i>Approximate calculation of multiple
 * integrals</i>; McNamee and Stenger 1967, <i>Construction of fully symmetric numerical integration
 * formulas</i>, Numerische Mathematik 10.
 */
public final class CubatureRule implements PointRule {
  private final IntFunction<UnitPoints> points;

  private CubatureRule(IntFunction<UnitPoints> points) {
    this.points = points;
  }

  /** {@return the spherical-radial rule of degree 3} */
  public static CubatureRule degreeThree() {
    return new CubatureRule(n -> AxisPoints.of(n, Math.sqrt(n), 0, 0, 0.5 / n));
  }

  /**
   * {@return the spherical-radial rule of degree 5}
   *
   * <p>Take it where degree 3 falls short and three nodes on each of n axes are too many.
   */
  public static CubatureRule degreeFive() {
    return new CubatureRule(n -> {
      double square = n + 2.0;
      double pair = 1 / (square * square);
      return pairs(
          n, Math.sqrt(square), (4 - n) * pair / 2, Math.sqrt(square / 2), pair, 2 / square);
    });
  }

  /**
   * {@return the rule of degree 5 with points at +-sqrt(3) along one or two axes}
   *
   * <p>Take it before {@link #degreeFive()} where functions bend along one axis at a time, and in few
   * dimensions: along every axis it is the Gauss-Hermite rule of 3 nodes.
   */
  public static CubatureRule mcNameeStenger() {
    double distance = Math.sqrt(3);
    return new CubatureRule(
        n -> pairs(n, distance, (4 - n) / 18.0, distance, 1 / 36.0, 1 + n * (n - 7.0) / 18));
  }

  private static UnitPoints pairs(
      int n, double onAxis, double axisWeight, double offAxes, double pairWeight, double centre) {
    UnitPoints.refuseAbove("cubature of degree 5 on " + n + " axes", 2.0 * n * n + 1);
    double[][] points = new double[2 * n * n][n];
    double[] weights = new double[points.length];
    AxisPoints.fill(points, n, onAxis);
    Arrays.fill(weights, 0, 2 * n, axisWeight);
    Arrays.fill(weights, 2 * n, weights.length, pairWeight);
    int next = 2 * n;
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        for (int signs = 0; signs < 4; signs++) {
          points[next][i] = signs < 2 ? offAxes : -offAxes;
          points[next++][j] = signs % 2 == 0 ? offAxes : -offAxes;
        }
      }
    }
    return UnitPoints.of(n, centre, centre, points, weights).exactTo(5);
  }

  @Override
  public UnitPoints points(int dimension) {
    return points.apply(dimension);
  }
}

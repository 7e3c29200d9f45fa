package dev.estimation.core.points;

import dev.estimation.core.internal.Checks;
import java.util.Arrays;
import java.util.function.IntToDoubleFunction;

/**
 * The spherical simplex rule: the centre and the n + 1 corners of a regular simplex, the fewest points
 * that have mean 0 and covariance I.
 *
 * <p>With w_0 the weight of the centre, all corners weigh w = (1 - w_0) / (n + 1) and lie at the distance
 * sqrt(n / (1 - w_0)). Along axis j = 1..n, corners 1 to j have the coordinate -1 / sqrt(j (j + 1) w),
 * corner j + 1 has j / sqrt(j (j + 1) w), and the later ones have 0.
 *
 * <p>Degree 2: third moments are wrong in two dimensions or more, and the rule treats axes unlike each
 * other, so results depend on the order of the components. Take it where models are dear and bend little.
 * Covariances are never indefinite while w_0 is not negative.
 *
 * <p>Cost: n + 2 evaluations. <i>Immutable.</i> Source: Julier 2003, <i>The spherical simplex unscented
 * transformation</i>, Proceedings of the American Control Conference.
 */
public final class SimplexRule implements PointRule {
  private final IntToDoubleFunction centreWeight;

  private SimplexRule(IntToDoubleFunction centreWeight) {
    this.centreWeight = centreWeight;
  }

  /**
   * {@return the rule with w_0 = 2 / (n + 2)}
   *
   * <p>Its corners lie at sqrt(n + 2), where the fourth moment of the distance, n (n + 2), is exact too; on
   * one axis it is the Gauss-Hermite rule of 3 nodes.
   */
  public static SimplexRule spherical() {
    return new SimplexRule(n -> 2 / (n + 2.0));
  }

  /**
   * The rule with a given weight of the centre, in every dimension.
   *
   * @param centreWeight w_0, below 1; the nearer to 1, the farther out the corners
   * @return the rule
   */
  public static SimplexRule spherical(double centreWeight) {
    Checks.finite("weight of the centre", centreWeight);
    if (!(centreWeight < 1)) {
      throw new IllegalArgumentException(
          "weight of the centre must be < 1, got " + centreWeight + " (simplex rule)");
    }
    return new SimplexRule(n -> centreWeight);
  }

  @Override
  public UnitPoints points(int dimension) {
    UnitPoints.refuseAbove("a simplex in " + dimension + " dimensions", dimension + 2.0);
    double centre = centreWeight.applyAsDouble(dimension);
    double weight = (1 - centre) / (dimension + 1);
    double[][] corners = new double[dimension + 1][dimension];
    for (int axis = 0; axis < dimension; axis++) {
      double j = axis + 1;
      double unit = 1 / Math.sqrt(j * (j + 1) * weight);
      for (int corner = 0; corner <= axis; corner++) {
        corners[corner][axis] = -unit;
      }
      corners[axis + 1][axis] = j * unit;
    }
    double[] weights = new double[dimension + 1];
    Arrays.fill(weights, weight);
    int degree = dimension == 1 ? AxisPoints.degree(1, corners[1][0]) : 2;
    return UnitPoints.of(dimension, centre, centre, corners, weights).exactTo(degree);
  }
}

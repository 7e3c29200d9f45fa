package dev.estimation.core.points;

/**
 * A way of standing for N(0, I) by weighted points, in any number of dimensions.
 *
 * <p>Its points must have weights that sum to 1, mean 0 and covariance I; a contract test holds every
 * rule of this library to that. Only samples ({@link UnitPoints#sample}) have mean and covariance but
 * roughly; they are there for reference values, not for filters. <i>Immutable.</i>
 */
@FunctionalInterface
public interface PointRule {
  /**
   * The points in the given number of dimensions.
   *
   * @param dimension 1 or more
   * @return the points
   * @throws IllegalArgumentException if the rule does not exist there, or has too many points
   */
  UnitPoints points(int dimension);
}

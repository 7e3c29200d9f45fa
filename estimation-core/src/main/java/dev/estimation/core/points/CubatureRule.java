package dev.estimation.core.points;

/**
 * The third-degree spherical-radial cubature rule: 2 n points on the axes at +-sqrt(n), of weight 1 /
 * (2 n).
 *
 * <p>Exact for all polynomials to degree 3. All weights are positive, so covariances are positive
 * semi-definite. The spread grows with the dimension.
 *
 * <p>Cost: 2 n + 1 evaluations, one of them at the centre, from which deviations are taken.
 * <i>Immutable.</i> Source: Arasaratnam and Haykin 2009, <i>Cubature Kalman filters</i>, IEEE
 * Transactions on Automatic Control 54(6).
 */
public final class CubatureRule implements PointRule {
  private CubatureRule() {}

  /** {@return the rule of degree 3} */
  public static CubatureRule degreeThree() {
    return new CubatureRule();
  }

  @Override
  public UnitPoints points(int dimension) {
    return AxisPoints.of(dimension, Math.sqrt(dimension), 0, 0, 0.5 / dimension);
  }
}

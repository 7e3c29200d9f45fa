package dev.estimation.core.points;

/** The spherical-radial rule of degree 5. */
class CubatureDegreeFiveTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return CubatureRule.degreeFive();
  }

  @Override
  int degree(int dimension) {
    return 5;
  }

  /** By their formula (4 - n): the weights on the axes. */
  @Override
  boolean neverIndefinite(int dimension) {
    return dimension <= 4;
  }

  /** By its formula: 1 and twice the negative weights. */
  @Override
  double amplification(int dimension) {
    double excess = dimension * (dimension - 4.0) / ((dimension + 2) * (dimension + 2));
    return 1 + 2 * Math.max(0, excess);
  }
}

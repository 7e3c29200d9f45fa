package dev.estimation.core.points;

/** The fifth-degree rule by McNamee and Stenger. */
class McNameeStengerTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return CubatureRule.mcNameeStenger();
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
    return 1 + 2 * Math.max(0, dimension * (dimension - 4) / 9.0);
  }
}

package dev.estimation.core.points;

/** The unscented rule with kappa = 3 - n. */
class UnscentedKappaThreeMinusDimensionTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.symmetric(n -> 3 - n);
  }

  @Override
  int degree(int dimension) {
    return dimension == 1 ? 5 : 3;
  }

  /** The centre weighs 1 - n / 3. */
  @Override
  boolean neverIndefinite(int dimension) {
    return dimension <= 3;
  }

  /** By its formula, where the centre is negative: 2 n / 3 - 1. */
  @Override
  double amplification(int dimension) {
    return Math.max(1, 2 * dimension / 3.0 - 1);
  }
}

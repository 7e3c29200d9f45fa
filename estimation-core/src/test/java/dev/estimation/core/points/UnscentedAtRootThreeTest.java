package dev.estimation.core.points;

/** The unscented rule with points at sqrt 3 standard deviations. */
class UnscentedAtRootThreeTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.atDeviations(Math.sqrt(3));
  }

  @Override
  int degree(int dimension) {
    return dimension == 1 ? 5 : 3;
  }

  /** By its formula. */
  @Override
  double covarianceWeightSum(int dimension) {
    return 1 + 1 + Math.max(2 - 3.0, -3.0 / dimension);
  }

  /** By its formula, where the centre is negative: 2 n / s^2 - 1. */
  @Override
  double amplification(int dimension) {
    return Math.max(1, 2 * dimension / 3.0 - 1);
  }
}

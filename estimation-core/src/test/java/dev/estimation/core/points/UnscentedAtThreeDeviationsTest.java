package dev.estimation.core.points;

/** The unscented rule with points at 3 standard deviations. */
class UnscentedAtThreeDeviationsTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.atDeviations(3);
  }

  /** By its formula. */
  @Override
  double covarianceWeightSum(int dimension) {
    return 1 + 1 + Math.max(2 - 9.0, -9.0 / dimension);
  }

  /** By its formula, where the centre is negative: 2 n / s^2 - 1. */
  @Override
  double amplification(int dimension) {
    return Math.max(1, 2 * dimension / 9.0 - 1);
  }
}

package dev.estimation.core.points;

/** The scaled unscented rule with alpha = 0.5, beta = 2, kappa = 0. */
class ScaledUnscentedHalfTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(0.5, 2, 0);
  }

  /** Common practice: 1 + (1 - alpha^2 + beta). */
  @Override
  double covarianceWeightSum(int dimension) {
    return 1 + (1 - 0.25 + 2);
  }

  /** By its formula: 2 / alpha^2 - 1. */
  @Override
  double amplification(int dimension) {
    return 2 / 0.25 - 1;
  }
}

package dev.estimation.core.points;

/** The scaled unscented rule with alpha = 1, beta = 2, kappa = 0. */
class ScaledUnscentedWideTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1, 2, 0);
  }

  /** Common practice: 1 + (1 - alpha^2 + beta). */
  @Override
  double covarianceWeightSum(int dimension) {
    return 1 + (1 - 1 + 2);
  }
}

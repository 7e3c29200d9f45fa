package dev.estimation.core.points;

/** The scaled unscented rule with alpha = 1e-3, beta = 2, kappa = 0. */
class ScaledUnscentedNarrowTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1e-3, 2, 0);
  }

  /** Common practice: 1 + (1 - alpha^2 + beta). */
  @Override
  double covarianceWeightSum(int dimension) {
    return 1 + (1 - 1e-6 + 2);
  }

  /** By its formula: 2 / alpha^2 - 1. */
  @Override
  double amplification(int dimension) {
    return 2 / 1e-6 - 1;
  }
}

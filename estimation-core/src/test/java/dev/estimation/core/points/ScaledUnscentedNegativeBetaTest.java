package dev.estimation.core.points;

/** The scaled unscented rule with alpha = 0.5, beta = -0.1, kappa = 0. */
class ScaledUnscentedNegativeBetaTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(0.5, -0.1, 0);
  }

  /** Common practice: 1 + (1 - alpha^2 + beta). */
  @Override
  double covarianceWeightSum(int dimension) {
    return 1 + (1 - 0.25 - 0.1);
  }

  @Override
  boolean neverIndefinite(int dimension) {
    return false;
  }

  /** By its formula: 2 / alpha^2 - 1. */
  @Override
  double amplification(int dimension) {
    return 2 / 0.25 - 1;
  }
}

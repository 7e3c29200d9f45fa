package dev.estimation.core.points;

/** The scaled unscented rule with alpha = 0.5, beta = 0, kappa = 1. */
class ScaledUnscentedWithoutBetaTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(0.5, 0, 1);
  }

  /** Common practice: 1 + (1 - alpha^2 + beta). */
  @Override
  double covarianceWeightSum(int dimension) {
    return 1 + (1 - 0.25);
  }

  /** By its formula, as the centre is negative: 2 n / (alpha^2 (n + kappa)) - 1. */
  @Override
  double amplification(int dimension) {
    return 2 * dimension / (0.25 * (dimension + 1)) - 1;
  }
}

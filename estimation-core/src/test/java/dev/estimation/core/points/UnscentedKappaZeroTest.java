package dev.estimation.core.points;

/** The unscented rule with kappa = 0. */
class UnscentedKappaZeroTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1, 0, 0);
  }
}

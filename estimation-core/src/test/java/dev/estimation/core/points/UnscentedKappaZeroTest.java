package dev.estimation.core.points;

/** The unscented rule with kappa = 0. */
class UnscentedKappaZeroTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.symmetric(0);
  }
}

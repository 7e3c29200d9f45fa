package dev.estimation.core.points;

/** The unscented rule with kappa = 1. */
class UnscentedKappaOneTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.symmetric(1);
  }
}

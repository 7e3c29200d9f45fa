package dev.estimation.core.points;

/** The unscented rule with kappa = 2. */
class UnscentedKappaTwoTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1, 0, 2);
  }
}

package dev.estimation.core.points;

/** The unscented rule with kappa = 3 - n. */
class UnscentedKappaThreeMinusDimensionTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1, 0, n -> 3 - n);
  }
}

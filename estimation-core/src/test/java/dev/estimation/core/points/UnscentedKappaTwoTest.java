package dev.estimation.core.points;

/** The unscented rule with kappa = 2. */
class UnscentedKappaTwoTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return UnscentedRule.symmetric(2);
  }

  @Override
  int degree(int dimension) {
    return dimension == 1 ? 5 : 3;
  }
}

package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnscentedRule;

/** Unscented with kappa = 3 - n. */
class UnscentedKappaMatchingTest extends PointMatchingContract implements FrozenInputChecks {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1, 0, n -> 3 - n);
  }
}

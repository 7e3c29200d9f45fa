package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnscentedRule;

/** Scaled unscented, alpha = 1, beta = 2, kappa = 0. */
class UnscentedWideMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1, 2, 0);
  }
}

package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnscentedRule;

/** Scaled unscented, alpha = 0.5, beta = 2, kappa = 0. */
class UnscentedHalfMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(0.5, 2, 0);
  }
}

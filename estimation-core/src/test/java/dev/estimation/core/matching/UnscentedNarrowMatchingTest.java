package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnscentedRule;

/** Scaled unscented, alpha = 1e-3, beta = 2, kappa = 0. */
class UnscentedNarrowMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1e-3, 2, 0);
  }

  /** Rounding is multiplied by 2e6: a mean of 1e9 deviations would leave no digit. */
  @Override
  public double largestOffset() {
    return 1e6;
  }
}

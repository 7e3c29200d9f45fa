package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnscentedRule;

/** Unscented, points at 2 standard deviations. */
class UnscentedAtTwoDeviationsMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return UnscentedRule.atDeviations(2);
  }
}

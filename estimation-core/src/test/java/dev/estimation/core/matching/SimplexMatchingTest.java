package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.SimplexRule;

/** Spherical simplex. */
class SimplexMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return SimplexRule.spherical();
  }

  @Override
  public int evaluations(int carried) {
    return carried + 2;
  }
}

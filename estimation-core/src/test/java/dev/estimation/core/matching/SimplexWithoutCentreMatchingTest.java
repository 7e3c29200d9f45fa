package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.SimplexRule;

/** Spherical simplex without weight at the centre. */
class SimplexWithoutCentreMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return SimplexRule.spherical(0);
  }

  @Override
  public int evaluations(int carried) {
    return carried + 2;
  }
}

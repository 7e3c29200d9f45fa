package dev.estimation.core.matching;

import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;

/** Gauss-Hermite products of 3 nodes an axis. */
class GaussHermiteThreeMatchingTest extends PointMatchingContract implements FrozenInputChecks {
  @Override
  PointRule rule() {
    return GaussHermiteRule.product(3);
  }

  @Override
  public int evaluations(int carried) {
    return (int) Math.pow(3, carried);
  }

  @Override
  public int largestDimension() {
    return 8;
  }
}

package dev.estimation.core.matching;

import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;

/** Gauss-Hermite products of 5 nodes an axis. */
class GaussHermiteFiveMatchingTest extends PointMatchingContract implements FrozenInputChecks {
  @Override
  PointRule rule() {
    return GaussHermiteRule.product(5);
  }

  @Override
  public int evaluations(int carried) {
    return (int) Math.pow(5, carried);
  }

  @Override
  public int largestDimension() {
    return 6;
  }
}

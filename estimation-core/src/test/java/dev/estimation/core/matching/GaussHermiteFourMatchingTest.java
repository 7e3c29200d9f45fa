package dev.estimation.core.matching;

import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;

/** Gauss-Hermite products of 4 nodes an axis; the centre is one more evaluation. */
class GaussHermiteFourMatchingTest extends PointMatchingContract implements FrozenInputChecks {
  @Override
  PointRule rule() {
    return GaussHermiteRule.product(4);
  }

  @Override
  public int evaluations(int carried) {
    return (int) Math.pow(4, carried) + 1;
  }

  @Override
  public int largestDimension() {
    return 6;
  }
}

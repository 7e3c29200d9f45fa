package dev.estimation.core.matching;

import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.PointRule;

/** Spherical-radial cubature of degree 5. */
class CubatureFiveMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return CubatureRule.degreeFive();
  }

  @Override
  public int evaluations(int carried) {
    return 2 * carried * carried + 1;
  }
}

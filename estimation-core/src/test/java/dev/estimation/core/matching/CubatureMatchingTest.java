package dev.estimation.core.matching;

import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.PointRule;

/** Third-degree cubature. */
class CubatureMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return CubatureRule.degreeThree();
  }
}

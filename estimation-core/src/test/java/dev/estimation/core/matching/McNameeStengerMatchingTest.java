package dev.estimation.core.matching;

import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.PointRule;

/** The fifth-degree rule by McNamee and Stenger. */
class McNameeStengerMatchingTest extends PointMatchingContract implements FrozenInputChecks {
  @Override
  PointRule rule() {
    return CubatureRule.mcNameeStenger();
  }

  @Override
  public int evaluations(int carried) {
    return 2 * carried * carried + 1;
  }
}

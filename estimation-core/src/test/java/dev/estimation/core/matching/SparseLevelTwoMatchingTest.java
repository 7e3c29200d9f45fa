package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.SparseGridRule;

/** Sparse grids of level 2. */
class SparseLevelTwoMatchingTest extends PointMatchingContract implements FrozenInputChecks {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(2);
  }

  @Override
  public int evaluations(int carried) {
    return 1 + 6 * carried + 2 * carried * carried;
  }
}

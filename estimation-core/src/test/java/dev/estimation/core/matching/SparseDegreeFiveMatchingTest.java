package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.SparseGridRule;

/** Sparse grids of degree 5. */
class SparseDegreeFiveMatchingTest extends PointMatchingContract implements FrozenInputChecks {
  @Override
  PointRule rule() {
    return SparseGridRule.ofDegree(5);
  }

  /** On 4 axes the 8 points on the axes have no weight. */
  @Override
  public int evaluations(int carried) {
    return 1 + 2 * carried * carried - (carried == 4 ? 8 : 0);
  }
}

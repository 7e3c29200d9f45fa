package dev.estimation.core.points;

/** Sparse grids of level 1. */
class SparseLevelOneTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(1);
  }
}

package dev.estimation.core.points;

/** Sparse grids of level 2. */
class SparseLevelTwoTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(2);
  }

  @Override
  int degree() {
    return 5;
  }
}

package dev.estimation.core.points;

/** Sparse grids of level 3. */
class SparseLevelThreeTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(3);
  }

  @Override
  int degree() {
    return 7;
  }
}

package dev.estimation.core.points;

/** Sparse grids of level 4. */
class SparseLevelFourTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(4);
  }

  @Override
  int degree() {
    return 11;
  }

  /** A plain sum of ten thousand weights, many of them equal, rounds to one side beyond sqrt N. */
  @Override
  int largestDimension() {
    return 8;
  }
}

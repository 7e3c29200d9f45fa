package dev.estimation.core.points;

/** Sparse grids of level 1. */
class SparseLevelOneTest extends SparseGridContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(1);
  }

  @Override
  int degree(int dimension) {
    int[] first = {5};
    return dimension <= first.length ? first[dimension - 1] : 3;
  }

  @Override
  boolean neverIndefinite(int dimension) {
    return dimension <= 3;
  }
}

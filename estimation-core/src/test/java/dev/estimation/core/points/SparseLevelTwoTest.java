package dev.estimation.core.points;

/** Sparse grids of level 2. */
class SparseLevelTwoTest extends SparseGridContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(2);
  }

  @Override
  int degree(int dimension) {
    int[] first = {15, 7};
    return dimension <= first.length ? first[dimension - 1] : 5;
  }
}

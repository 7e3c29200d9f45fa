package dev.estimation.core.points;

/** Sparse grids of level 3. */
class SparseLevelThreeTest extends SparseGridContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(3);
  }

  @Override
  int degree(int dimension) {
    int[] first = {29, 11, 9};
    return dimension <= first.length ? first[dimension - 1] : 7;
  }

  @Override
  boolean neverIndefinite(int dimension) {
    return false;
  }
}

package dev.estimation.core.points;

/** Sparse grids of level 4. */
class SparseLevelFourTest extends SparseGridContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofLevel(4);
  }

  /** A plain sum of ten thousand weights, many of them equal, rounds to one side beyond sqrt N. */
  @Override
  int largestDimension() {
    return 8;
  }

  @Override
  int degree(int dimension) {
    int[] first = {51, 21, 13, 11};
    return dimension <= first.length ? first[dimension - 1] : 9;
  }
}

package dev.estimation.core.points;

/** Sparse grids of degree 9. */
class SparseDegreeNineTest extends SparseGridContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofDegree(9);
  }

  /** A plain sum of ten thousand weights, many of them equal, rounds to one side beyond sqrt N. */
  @Override
  int largestDimension() {
    return 8;
  }

  @Override
  int degree(int dimension) {
    int[] first = {15, 11};
    return dimension <= first.length ? first[dimension - 1] : 9;
  }
}

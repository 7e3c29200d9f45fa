package dev.estimation.core.points;

/** Sparse grids of degree 5. */
class SparseDegreeFiveTest extends SparseGridContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofDegree(5);
  }

  @Override
  int degree(int dimension) {
    return 5;
  }

  @Override
  boolean neverIndefinite(int dimension) {
    return dimension <= 4;
  }
}

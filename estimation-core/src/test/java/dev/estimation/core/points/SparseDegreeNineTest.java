package dev.estimation.core.points;

/** Sparse grids of degree 9. */
class SparseDegreeNineTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofDegree(9);
  }

  @Override
  int degree() {
    return 9;
  }

  /** A plain sum of ten thousand weights, many of them equal, rounds to one side beyond sqrt N. */
  @Override
  int largestDimension() {
    return 8;
  }
}

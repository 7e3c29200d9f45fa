package dev.estimation.core.points;

/** Sparse grids of degree 5. */
class SparseDegreeFiveTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SparseGridRule.ofDegree(5);
  }

  @Override
  int degree() {
    return 5;
  }
}

package dev.estimation.core.points;

/** The Gauss-Hermite product of 2 nodes an axis; 2^12 is within 100 000 points. */
class GaussHermiteTwoTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return GaussHermiteRule.product(2);
  }

  @Override
  int degree(int dimension) {
    return 3;
  }

  @Override
  int largestDimension() {
    return 6;
  }
}

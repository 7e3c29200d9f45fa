package dev.estimation.core.points;

/** The Gauss-Hermite product of 4 nodes an axis; 4^8 is within 100 000 points. */
class GaussHermiteFourTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return GaussHermiteRule.product(4);
  }

  @Override
  int degree(int dimension) {
    return 7;
  }

  @Override
  int largestDimension() {
    return 6;
  }
}

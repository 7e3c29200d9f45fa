package dev.estimation.core.points;

/** The Gauss-Hermite product of 3 nodes an axis; 3^10 is within 100 000 points. */
class GaussHermiteThreeTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return GaussHermiteRule.product(3);
  }

  @Override
  int degree(int dimension) {
    return 5;
  }

  @Override
  int largestDimension() {
    return 6;
  }
}

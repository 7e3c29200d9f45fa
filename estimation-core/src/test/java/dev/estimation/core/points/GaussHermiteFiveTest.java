package dev.estimation.core.points;

/** The Gauss-Hermite product of 5 nodes an axis; 5^7 is within 100 000 points. */
class GaussHermiteFiveTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return GaussHermiteRule.product(5);
  }

  @Override
  int degree(int dimension) {
    return 9;
  }

  @Override
  int largestDimension() {
    return 6;
  }
}

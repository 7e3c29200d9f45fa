package dev.estimation.core.points;

/** The spherical simplex rule with half of the weight at the centre. */
class SimplexHeavyCentreTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SimplexRule.spherical(0.5);
  }

  @Override
  int degree(int dimension) {
    return dimension == 1 ? 3 : 2;
  }

  @Override
  boolean axesAlike(int dimension) {
    return false;
  }

  @Override
  boolean mirrored(int dimension) {
    return dimension == 1;
  }
}

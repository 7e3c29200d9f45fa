package dev.estimation.core.points;

/** The spherical simplex rule without weight at the centre. */
class SimplexWithoutCentreTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SimplexRule.spherical(0);
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

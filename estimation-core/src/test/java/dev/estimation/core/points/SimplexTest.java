package dev.estimation.core.points;

/** The spherical simplex rule with the weight it gives the centre, 2 / (n + 2). */
class SimplexTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SimplexRule.spherical();
  }

  @Override
  int degree(int dimension) {
    return dimension == 1 ? 5 : 2;
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

package dev.estimation.core.points;

/** The spherical simplex rule with a negative centre: corners come nearer. */
class SimplexNegativeCentreTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return SimplexRule.spherical(-0.5);
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

  @Override
  boolean neverIndefinite(int dimension) {
    return false;
  }

  /** The centre weighs -0.5, the corners 1.5. */
  @Override
  double amplification(int dimension) {
    return 2;
  }
}

package dev.estimation.core.points;

/** The third-degree cubature rule. */
class CubatureDegreeThreeTest extends PointRuleContract {
  @Override
  PointRule rule() {
    return CubatureRule.degreeThree();
  }
}

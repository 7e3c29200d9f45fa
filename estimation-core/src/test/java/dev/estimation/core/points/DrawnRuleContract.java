package dev.estimation.core.points;

/** What a rule of drawn and standardised points owes: all but the symmetries. */
abstract class DrawnRuleContract extends PointRuleContract {
  @Override
  int degree(int dimension) {
    return 2;
  }

  /** Axes are drawn one by one. */
  @Override
  boolean axesAlike(int dimension) {
    return false;
  }

  /** Points come as they are drawn. */
  @Override
  boolean mirrored(int dimension) {
    return false;
  }
}

package dev.estimation.core.points;

/** The contract for sparse grids, whose weights are negative in part. */
abstract class SparseGridContract extends PointRuleContract {
  /** As weights sum to 1: 1 and twice the negative ones. */
  @Override
  double amplification(int dimension) {
    UnitPoints points = rule().points(dimension);
    double negative = Math.min(0, points.centreMeanWeight());
    for (int i = 0; i < points.size(); i++) {
      negative += Math.min(0, points.weight(i));
    }
    return 1 - 2 * negative;
  }

  /** On one axis all but the third level are positive. */
  @Override
  boolean neverIndefinite(int dimension) {
    return dimension == 1;
  }
}

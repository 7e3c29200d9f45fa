package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnitPoints;

/** The contract for a matching by points; rounding follows from the points. */
abstract class PointMatchingContract extends MomentMatchingContract {
  abstract PointRule rule();

  @Override
  public MomentMatching matching(double... inputScales) {
    return PointMatching.of(rule());
  }

  @Override
  public double spread(int carried) {
    return spread(rule().points(carried));
  }

  /** The smallest distance of a point from the centre. */
  static double spread(UnitPoints points) {
    double smallest = Double.POSITIVE_INFINITY;
    for (int i = 0; i < points.size(); i++) {
      double sum = 0;
      for (int entry = points.start(i); entry < points.start(i + 1); entry++) {
        sum += points.coordinate(entry) * points.coordinate(entry);
      }
      smallest = Math.min(smallest, Math.sqrt(sum));
    }
    return smallest;
  }

  @Override
  public double amplification(int carried) {
    return rule().points(carried).weightAmplification();
  }

  /** 2 n points and the centre; rules that differ say so. */
  @Override
  public int evaluations(int carried) {
    return 2 * carried + 1;
  }
}

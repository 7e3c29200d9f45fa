package dev.estimation.core.points;

import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Whether points come to lie on points of the same weight. */
final class SymmetryCheck {
  private final Map<List<Double>, Double> weights = new HashMap<>();

  private SymmetryCheck(UnitPoints points) {
    for (int i = 0; i < points.size(); i++) {
      weights.put(UnitMoments.key(UnitMoments.place(points, i)), points.weight(i));
    }
    if (points.size() != weights.size()) {
      throw new AssertionError("two points in one place");
    }
  }

  /** When two axes are exchanged. */
  static boolean axesAlike(UnitPoints points) {
    SymmetryCheck check = new SymmetryCheck(points);
    boolean alike = true;
    for (int axis = 1; axis < points.dimension(); axis++) {
      for (int i = 0; i < points.size(); i++) {
        double[] place = UnitMoments.place(points, i);
        double kept = place[axis];
        place[axis] = place[0];
        place[0] = kept;
        alike &= check.has(place, points.weight(i));
      }
    }
    return alike;
  }

  /** When all signs are changed. */
  static boolean mirrored(UnitPoints points) {
    SymmetryCheck check = new SymmetryCheck(points);
    boolean mirrored = true;
    for (int i = 0; i < points.size(); i++) {
      double[] place = UnitMoments.place(points, i);
      for (int axis = 0; axis < place.length; axis++) {
        place[axis] = -place[axis];
      }
      mirrored &= check.has(place, points.weight(i));
    }
    return mirrored;
  }

  /** A product of n weights is rounded n - 1 times, in another order: 2 n eps with n up to 5. */
  private boolean has(double[] place, double weight) {
    Double found = weights.get(UnitMoments.key(place));
    return found != null && Math.abs(found - weight) <= 10 * 0x1p-52 * Math.abs(weight);
  }
}

package dev.estimation.core.matching;

import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;

/** The points u_i = m + L xi_i, one at a time, moved over the active inputs alone. */
final class PointPlacement {
  private final UnitPoints points;
  private final ActiveFactor active;
  private final Space space;
  private final boolean flat;
  private final int[] inputs;
  private final double[] zeros;
  private final double[] displacement;
  private final double[] point;

  PointPlacement(UnitPoints points, ActiveFactor active, Space space) {
    this.points = points;
    this.active = active;
    this.space = space;
    this.flat = space.isVectorSpace();
    this.inputs = active.inputs();
    this.zeros = new double[space.dimension()];
    this.displacement = new double[space.dimension()];
    this.point = new double[space.storage()];
  }

  /** Begins a call: inputs that are not active stay at the mean. */
  void begin(double[] mean) {
    System.arraycopy(mean, 0, point, 0, point.length);
  }

  /** Places point i. */
  double[] place(int i, double[] mean) {
    double[] start = flat ? mean : zeros;
    double[] moved = flat ? point : displacement;
    int first = points.start(i);
    int count = points.start(i + 1) - first;
    if (count == 1) {
      addColumn(points.axis(first), points.coordinate(first), start, moved);
    } else {
      addColumns(first, first + count, start, moved);
    }
    if (!flat) {
      space.displace(mean, displacement, point);
    }
    return point;
  }

  /** The start plus a column of L times a coordinate, over the active inputs. */
  private void addColumn(int axis, double coordinate, double[] start, double[] result) {
    double[] factor = active.factor().data;
    int n = displacement.length;
    for (int input : inputs) {
      result[input] = start[input] + factor[input * n + axis] * coordinate;
    }
  }

  private void addColumns(int from, int to, double[] start, double[] result) {
    double[] factor = active.factor().data;
    int n = displacement.length;
    for (int input : inputs) {
      double sum = start[input];
      for (int entry = from; entry < to; entry++) {
        sum += factor[input * n + points.axis(entry)] * points.coordinate(entry);
      }
      result[input] = sum;
    }
  }
}

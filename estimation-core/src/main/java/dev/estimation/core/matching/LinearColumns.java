package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * What the inputs add in which a function is linear once the others are given, by the columns A S of {@link LinearSlopes}
 * at every point. None where there are no such inputs.
 *
 * <p>Two ways of writing E[A S S' A']. With no centre weight below 0: at each point the columns A S, with the mean
 * weight of the point. Else those would cancel, by 1e6 for a narrow spread, and might leave an indefinite sum. So E[A] S has
 * columns of its own, of weight 1, and the covariance of each column of A S is written as {@link
 * PointColumns} writes that of z, with the same weights: deviations from the centre, and their mean.
 */
final class LinearColumns {
  private final UnitPoints points;
  private final int nonlinear;
  private final int count;
  private final boolean centreWeighed;
  private final boolean aboutMean;
  private final double shiftFraction;
  private final double[] weights;
  private final int rows;
  private final LinearSlopes slopes;

  private LinearColumns(
      BaseWorkspace owner, VectorFunction function, UnitPoints points, int count) {
    this.points = points;
    this.count = count;
    this.nonlinear = owner.active.count() - count;
    this.centreWeighed = points.centreMeanWeight() != 0;
    this.aboutMean = points.centreMeanWeight() < 0;
    this.shiftFraction = PointColumns.shiftFraction(points);
    this.weights = weights(points, count, aboutMean ? PointColumns.deltaWeight(points) : 0);
    this.rows = owner.outputSpace.dimension();
    this.slopes = new LinearSlopes(owner, function, nonlinear);
  }

  /** In this order: the centre or E[A], the points, and the mean of their deviations if it has a weight. */
  private static double[] weights(UnitPoints points, int count, double deltaWeight) {
    double centre = points.centreMeanWeight();
    int first = centre == 0 ? 0 : count;
    int last = first + points.size() * count;
    double[] weights = new double[last + (deltaWeight == 0 ? 0 : count)];
    Arrays.fill(weights, last, weights.length, deltaWeight);
    for (int i = 0; i < last; i++) {
      double ofCentre = centre < 0 ? 1 : centre;
      weights[i] = i < first ? ofCentre : points.weight((i - first) / count);
    }
    return weights;
  }

  static LinearColumns of(BaseWorkspace owner, VectorFunction function, UnitPoints points) {
    int count = owner.active.count() - points.dimension();
    return new LinearColumns(owner, function, points, count);
  }

  /** The inputs that a function reads, those in which it is linear last. */
  static int[] inputs(VectorFunction function, Space space) {
    int[] bent = function.structure().nonlinearInputs(space.dimension());
    int[] linear = function.structure().linearInputs();
    int[] all = Arrays.copyOf(bent, bent.length + linear.length);
    System.arraycopy(linear, 0, all, bent.length, linear.length);
    return all;
  }

  double[] weights() {
    return weights;
  }

  int count() {
    return count;
  }

  /** Fills the columns of the centre, if it has a weight; false if a value is not finite. */
  boolean fillCentre(double[] mean, double[] given, double[] centre, double[] data, int stride) {
    return count == 0
        || !centreWeighed
        || slopes.fill(stride - weights.length, mean, given, centre, data, stride);
  }

  /** The columns of a point; false if a value is not finite. */
  boolean fillPoint(
      int i, double[] point, double[] given, double[] output, double[] data, int stride) {
    if (count == 0) {
      return true;
    }
    int before = i + (centreWeighed ? 1 : 0);
    return slopes.fill(
        stride - weights.length + before * count, point, given, output, data, stride);
  }

  /** Brings the columns about their mean if the centre's weight is below 0. */
  void centre(double[] data, int stride) {
    if (!aboutMean) {
      return;
    }
    int first = stride - weights.length;
    for (int c = 0; c < rows; c++) {
      for (int q = 0; q < count; q++) {
        centreEntry(data, c * stride + first + q);
      }
    }
  }

  /** One component of one column of A S, whose value at the centre stands at an index. */
  private void centreEntry(double[] data, int at) {
    int last = points.size() * count;
    double delta = 0;
    for (int i = 0, j = at + count; i < points.size(); i++, j += count) {
      data[j] -= data[at];
      delta += points.weight(i) * data[j];
    }
    data[at] += delta;
    for (int j = at + count; j <= at + last; j += count) {
      data[j] -= shiftFraction * delta;
    }
    if (weights.length > count + last) {
      data[at + count + last] = delta;
    }
  }

  /** How many of the columns, the first, have a mean that W tells. */
  int meanColumns() {
    return aboutMean ? count : weights.length;
  }

  /** The rows of W that belong to these inputs: the means of the columns. */
  void fillCross(double[] w, WeightedColumns columns) {
    int stride = columns.count();
    int m = rows;
    for (int i = 0; i < meanColumns(); i++) {
      int row = (nonlinear + i % count) * m;
      for (int c = 0; c < m; c++) {
        w[row + c] += weights[i] * columns.data()[c * stride + stride - weights.length + i];
      }
    }
  }

  /** Why a fill was false. */
  MatchingStatus fault() {
    return slopes.fault();
  }

  /** The entry of the Jacobian that is not finite. */
  String failure() {
    return slopes.failure();
  }
}

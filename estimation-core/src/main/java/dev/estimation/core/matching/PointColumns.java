package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.points.UnitPoints;
import java.util.Arrays;

/**
 * The weighted columns of a point matching, in this order: one for each point, one for delta, one for each
 * replicate of several points, and those of linear inputs. Two ways of writing one covariance:
 *
 * <ul>
 *   <li>about the centre's image: columns d_i, and delta with weight f = wc_0 - wm_0 - 1;
 *   <li>about the mean of the points alone: columns d_i - delta / V, V = sum w_i = 1 - wm_0, and delta with
 *       weight f + 1 / V, the largest that any centre gives.
 * </ul>
 *
 * <p>The first serves where its weight is not negative: a huge negative centre weight then costs no digits. The
 * second serves the others: nothing is subtracted then unless the rule itself cannot promise a positive
 * semi-definite result.
 */
final class PointColumns {
  private final UnitPoints points;
  private final double shiftFraction;
  private final double[] meanWeights;
  private final double[] weights;
  private final WeightedColumns total;
  private final WeightedColumns left;
  private final int[] axes;
  private final double[] coordinates;
  private final double[] weightedCoordinates;
  private final int rows;
  private final int deltaColumn;
  private final int linearColumn;

  PointColumns(int rows, UnitPoints points, double[] linearWeights, Form form) {
    this.points = points;
    this.rows = rows;
    int size = points.size();
    this.shiftFraction = shiftFraction(points);
    double deltaWeight = deltaWeight(points);
    this.meanWeights = new double[size];
    Arrays.setAll(meanWeights, points::weight);
    this.deltaColumn = deltaWeight == 0 ? -1 : size;
    int replicates = size > points.replicates() ? points.replicates() : 0;
    int first = size + (deltaWeight == 0 ? 0 : 1);
    this.linearColumn = first + (replicates > 1 ? replicates : 0);
    this.weights = Arrays.copyOf(meanWeights, linearColumn + linearWeights.length);
    if (points.replicates() == size) {
      Arrays.fill(weights, 0, size, 1 / (size - 1.0)); // independent draws
    }
    Arrays.fill(weights, size, first, deltaWeight);
    Arrays.fill(weights, first, linearColumn, 1 / (replicates * (replicates - 1.0)));
    System.arraycopy(linearWeights, 0, weights, linearColumn, linearWeights.length);
    int onAxes = pointsOnAxes(points);
    this.axes = new int[onAxes];
    this.coordinates = new double[onAxes];
    this.weightedCoordinates = new double[onAxes];
    for (int i = 0; i < onAxes; i++) {
      axes[i] = points.axis(points.start(i));
      coordinates[i] = points.coordinate(points.start(i));
      weightedCoordinates[i] = weights[i] * coordinates[i];
    }
    this.total = new WeightedColumns(rows, weights, form);
    this.left = new WeightedColumns(rows, weights, form);
  }

  /** How many of the first points lie on axes: all of them in many rules. */
  private static int pointsOnAxes(UnitPoints points) {
    int count = 0;
    while (count < points.size() && points.start(count + 1) - points.start(count) == 1) {
      count++;
    }
    return count;
  }

  private static double aboutCentre(UnitPoints points) {
    return points.centreCovarianceWeight() - points.centreMeanWeight() - 1;
  }

  /** The part of delta that is taken from the columns of points: 1 / V, or 0 if they stay about the centre. */
  static double shiftFraction(UnitPoints points) {
    double sum = 1 - points.centreMeanWeight();
    return aboutCentre(points) < 0 && sum > 0 ? 1 / sum : 0;
  }

  /** The weight of the column of delta. */
  static double deltaWeight(UnitPoints points) {
    return aboutCentre(points) + shiftFraction(points);
  }

  WeightedColumns total() {
    return total;
  }

  /** delta = sum w_i d_i. */
  void fillShift(double[] shift) {
    double[] data = total.data();
    int stride = weights.length;
    int size = meanWeights.length;
    for (int c = 0; c < rows; c++) {
      int at = c * stride;
      double sum = 0;
      for (int i = 0; i < size; i++) {
        sum += meanWeights[i] * data[at + i];
      }
      shift[c] = sum;
    }
  }

  /** Brings the columns of points about the mean if need be, and sets that of delta. */
  void centre(double[] shift) {
    double[] data = total.data();
    int stride = weights.length;
    int size = meanWeights.length;
    for (int c = 0; c < rows; c++) {
      int at = c * stride;
      if (shiftFraction != 0) {
        double delta = shiftFraction * shift[c];
        for (int i = 0; i < size; i++) {
          data[at + i] -= delta;
        }
      }
      if (deltaColumn >= 0) {
        data[at + deltaColumn] = shift[c];
      }
    }
  }

  /** W = sum w_i xi_i d_i', over the axes of the points; about the mean it is the same. */
  void fillCross(double[] w) {
    double[] data = total.data();
    int stride = weights.length;
    Arrays.fill(w, 0);
    for (int c = 0; c < rows; c++) {
      int at = c * stride;
      for (int i = 0; i < axes.length; i++) {
        w[axes[i] * rows + c] += weightedCoordinates[i] * data[at + i];
      }
      for (int i = axes.length; i < meanWeights.length; i++) {
        double weighted = weights[i] * data[at + i];
        int end = points.start(i + 1);
        for (int entry = points.start(i); entry < end; entry++) {
          w[points.axis(entry) * rows + c] += weighted * points.coordinate(entry);
        }
      }
    }
  }

  /**
   * What regression leaves: W' xi_i taken from the column of point i, and from the columns of linear inputs that
   * have a mean that mean, the row of W that belongs to it.
   *
   * @param w W, k x m
   */
  WeightedColumns residuals(double[] w, LinearColumns linear) {
    double[] data = total.data();
    double[] rest = left.data();
    int stride = weights.length;
    for (int c = 0; c < rows; c++) {
      int at = c * stride;
      for (int i = 0; i < axes.length; i++) {
        rest[at + i] = data[at + i] - coordinates[i] * w[axes[i] * rows + c];
      }
      for (int i = axes.length; i < meanWeights.length; i++) {
        double sum = data[at + i];
        int end = points.start(i + 1);
        for (int entry = points.start(i); entry < end; entry++) {
          sum -= points.coordinate(entry) * w[points.axis(entry) * rows + c];
        }
        rest[at + i] = sum;
      }
      for (int i = meanWeights.length; i < stride; i++) {
        rest[at + i] = data[at + i];
      }
    }
    for (int i = 0; i < linear.meanColumns(); i++) {
      int row = (points.dimension() + i % linear.count()) * rows;
      for (int c = 0, at = linearColumn + i; c < rows; c++, at += stride) {
        rest[at] -= w[row + c];
      }
    }
    return left;
  }
}

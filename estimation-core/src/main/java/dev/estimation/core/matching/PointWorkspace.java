package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.internal.Products;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/** Carries moments by points; see {@link PointMatching} for the formulas. */
class PointWorkspace extends BaseWorkspace {
  final UnitPoints points;
  final double[] shift;

  /** The deviations d_i, one row a point. */
  final double[] deviations;

  private final double[] weights;
  private final double[] residuals;
  private final double centreFactor;
  private final double[] displacement;
  private final double[] point;
  private final double[] image;
  private final double[] deviation;

  PointWorkspace(Space input, Space output, VectorFunction function, UnitPoints points) {
    super(input, output, function);
    this.points = points;
    this.centreFactor = points.centreCovarianceWeight() - points.centreMeanWeight() - 1;
    this.weights = new double[points.size()];
    Arrays.setAll(weights, points::weight);
    this.displacement = new double[input.dimension()];
    this.point = new double[input.storage()];
    this.image = new double[output.storage()];
    this.deviation = new double[output.dimension()];
    this.deviations = new double[points.size() * output.dimension()];
    this.residuals = new double[deviations.length];
    this.shift = new double[output.dimension()];
  }

  @Override
  MatchingStatus match(double[] mean, double[] given, double[] outputMean, double[] covariance) {
    int m = shift.length;
    for (int i = 0; i < weights.length; i++) {
      place(i, mean);
      if (!function.evaluate(point, given, image)) {
        return MatchingStatus.FUNCTION_NOT_FINITE;
      }
      outputSpace.difference(image, centre, deviation);
      System.arraycopy(deviation, 0, deviations, i * m, m);
    }
    fillShift();
    fillCross();
    Products.fillInnerProduct(deviations, weights, weights.length, m, covariance);
    Products.addSquare(centreFactor, shift, covariance);
    outputSpace.displace(centre, shift, outputMean);
    return MatchingStatus.MATCHED;
  }

  /** Sets {@link #point} to m + L xi_i. */
  private void place(int i, double[] mean) {
    int first = points.start(i);
    int end = points.start(i + 1);
    if (first == end) {
      Arrays.fill(displacement, 0);
    } else {
      addColumn(first, true);
    }
    for (int entry = first + 1; entry < end; entry++) {
      addColumn(entry, false);
    }
    inputSpace.displace(mean, displacement, point);
  }

  /** Adds a column of L times a coordinate to the displacement, or starts it. */
  private void addColumn(int entry, boolean start) {
    double[] factor = active.columns().data;
    double[] target = displacement;
    double coordinate = points.coordinate(entry);
    int columns = active.count();
    int axis = points.axis(entry);
    for (int a = 0; a < columns; a++) {
      int row = active.input(a);
      double moved = factor[row * columns + axis] * coordinate;
      target[row] = start ? moved : target[row] + moved;
    }
  }

  /** delta = sum w_i d_i. */
  private void fillShift() {
    int m = shift.length;
    Arrays.fill(shift, 0);
    for (int i = 0, at = 0; i < weights.length; i++) {
      double weight = weights[i];
      for (int r = 0; r < m; r++, at++) {
        shift[r] += weight * deviations[at];
      }
    }
  }

  /** W = sum w_i xi_i d_i'. */
  private void fillCross() {
    int m = shift.length;
    double[] w = cross.data;
    Arrays.fill(w, 0);
    for (int i = 0; i < weights.length; i++) {
      int end = points.start(i + 1);
      for (int entry = points.start(i); entry < end; entry++) {
        double factor = weights[i] * points.coordinate(entry);
        int row = points.axis(entry) * m;
        int at = i * m;
        for (int c = 0; c < m; c++) {
          w[row + c] += factor * deviations[at + c];
        }
      }
    }
  }

  /**
   * With r_i = d_i - W' xi_i: sum w_i r_i r_i' + (wc_0 - wm_0 - 1) delta delta' + noise. The same as P_zz -
   * W'W where the points have mean 0 and covariance I, without subtracting large numbers.
   */
  @Override
  public void unexplainedCovariance(DMatrixRMaj result) {
    requireOutputShape(result);
    int m = shift.length;
    System.arraycopy(deviations, 0, residuals, 0, deviations.length);
    double[] w = cross.data;
    for (int i = 0; i < weights.length; i++) {
      int end = points.start(i + 1);
      for (int entry = points.start(i); entry < end; entry++) {
        double coordinate = points.coordinate(entry);
        int row = points.axis(entry) * m;
        for (int c = 0; c < m; c++) {
          residuals[i * m + c] -= coordinate * w[row + c];
        }
      }
    }
    Products.fillInnerProduct(residuals, weights, weights.length, m, result.data);
    Products.addSquare(centreFactor, shift, result.data);
    addNoise(result);
  }
}

package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.internal.Products;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/** Carries moments by points; see {@link PointMatching} for the formulas. */
class PointWorkspace extends BaseWorkspace {
  final UnitPoints points;
  private final double[] displacement;
  private final double[] point;
  private final double[] image;
  final double[] deviation;
  final double[] shift;

  PointWorkspace(Space input, Space output, VectorFunction function, UnitPoints points) {
    super(input, output, function);
    this.points = points;
    this.displacement = new double[input.dimension()];
    this.point = new double[input.storage()];
    this.image = new double[output.storage()];
    this.deviation = new double[output.dimension()];
    this.shift = new double[output.dimension()];
  }

  @Override
  MatchingStatus match(double[] mean, double[] given, double[] outputMean, double[] covariance) {
    Arrays.fill(shift, 0);
    Arrays.fill(covariance, 0);
    Arrays.fill(cross.data, 0);
    for (int i = 0; i < points.size(); i++) {
      place(i, mean);
      if (!function.evaluate(point, given, image)) {
        return MatchingStatus.FUNCTION_NOT_FINITE;
      }
      outputSpace.difference(image, centre, deviation);
      addDeviation(points.weight(i), covariance);
      addCross(i);
      keep(i);
    }
    double centreFactor = points.centreCovarianceWeight() - points.centreMeanWeight() - 1;
    Products.addSquare(centreFactor, shift, covariance);
    outputSpace.displace(centre, shift, outputMean);
    return MatchingStatus.MATCHED;
  }

  /** For those who need every deviation once more. */
  void keep(int i) {}

  /** Sets {@link #point} to m + L xi_i. */
  private void place(int i, double[] mean) {
    double[] factor = active.columns().data;
    int columns = active.count();
    for (int a = 0; a < columns; a++) {
      int row = active.input(a);
      double sum = 0;
      for (int entry = points.start(i); entry < points.start(i + 1); entry++) {
        sum += factor[row * columns + points.axis(entry)] * points.coordinate(entry);
      }
      displacement[row] = sum;
    }
    inputSpace.displace(mean, displacement, point);
  }

  private void addDeviation(double weight, double[] covariance) {
    for (int r = 0; r < deviation.length; r++) {
      shift[r] += weight * deviation[r];
    }
    Products.addSquare(weight, deviation, covariance);
  }

  private void addCross(int i) {
    int m = deviation.length;
    double[] w = cross.data;
    for (int entry = points.start(i); entry < points.start(i + 1); entry++) {
      double factor = points.weight(i) * points.coordinate(entry);
      int row = points.axis(entry) * m;
      for (int c = 0; c < m; c++) {
        w[row + c] += factor * deviation[c];
      }
    }
  }
}

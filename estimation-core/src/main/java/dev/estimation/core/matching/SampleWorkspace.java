package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/** Carries moments by independent draws, about their sample means. */
final class SampleWorkspace extends PointWorkspace implements SampledWorkspace {
  private final double[] pointMean;
  private final double[] minusOnes;

  SampleWorkspace(Space input, Space output, VectorFunction function, UnitPoints points) {
    super(input, output, function, points);
    this.pointMean = new double[points.dimension()];
    this.minusOnes = new double[points.dimension()];
    Arrays.fill(minusOnes, -1);
    for (int i = 0; i < points.size(); i++) {
      for (int entry = points.start(i); entry < points.start(i + 1); entry++) {
        pointMean[points.axis(entry)] += points.weight(i) * points.coordinate(entry);
      }
    }
  }

  /** From sums over N about the sample mean to division by N - 1, in P_zz and in W. */
  @Override
  MatchingStatus match(double[] mean, double[] given, double[] outputMean, double[] covariance) {
    MatchingStatus matched = super.match(mean, given, outputMean, covariance);
    double scale = points.size() / (points.size() - 1.0);
    int m = shift.length;
    for (int i = 0; i < m * m; i++) {
      covariance[i] *= scale;
    }
    for (int a = 0; a < pointMean.length; a++) {
      for (int c = 0; c < m; c++) {
        cross.data[a * m + c] = scale * (cross.data[a * m + c] - pointMean[a] * shift[c]);
      }
    }
    return matched;
  }

  /** P_zz - W'W: these points have a covariance of their own, not I. */
  @Override
  public void unexplainedCovariance(DMatrixRMaj result) {
    requireOutputShape(result);
    int m = shift.length;
    Products.fillInnerProduct(cross.data, minusOnes, pointMean.length, m, result.data);
    double[] total = output().covariance().data;
    for (int r = 0; r < m; r++) {
      for (int c = 0; c <= r; c++) {
        result.data[r * m + c] += total[r * m + c];
      }
    }
    SymmetricMatrix.mirrorLower(result);
  }

  @Override
  public double meanStandardError(int row) {
    return Math.sqrt(mean(row, row, false) / points.size());
  }

  @Override
  public double covarianceStandardError(int row, int column) {
    double covariance = mean(row, column, false);
    double fourth = mean(row, column, true);
    return Math.sqrt(Math.max(0, fourth - covariance * covariance) / points.size());
  }

  /** The mean of e_r e_c over the draws, or of its square; e is taken about the sample mean. */
  private double mean(int row, int column, boolean square) {
    int m = shift.length;
    double sum = 0;
    for (int i = 0; i < points.size(); i++) {
      double product =
          (deviations[i * m + row] - shift[row]) * (deviations[i * m + column] - shift[column]);
      sum += square ? product * product : product;
    }
    return sum / points.size();
  }
}

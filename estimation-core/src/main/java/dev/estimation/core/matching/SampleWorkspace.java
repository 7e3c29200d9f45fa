package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/** Carries moments by independent draws, about their sample means. */
final class SampleWorkspace extends PointWorkspace implements SampledWorkspace {
  private final WeightedColumns left;

  SampleWorkspace(
      Space input, Space output, VectorFunction function, UnitPoints points, Form form) {
    super(input, output, function, points, form);
    double[] weights = Arrays.copyOf(columns().weights(), columns().count() + active.count());
    Arrays.fill(weights, columns().count(), weights.length, -1);
    this.left = new WeightedColumns(output.dimension(), weights, form);
  }

  /** P_zz - W'W: these points have a covariance of their own, not I. */
  @Override
  WeightedColumns residuals() {
    double[] w = unitCrossCovariance().data;
    int m = shift.length;
    int count = columns().count();
    for (int c = 0; c < m; c++) {
      int row = c * left.count();
      System.arraycopy(columns().data(), c * count, left.data(), row, count);
      for (int a = 0; a < active.count(); a++) {
        left.data()[row + count + a] = w[a * m + c];
      }
    }
    return left;
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
    double[] data = columns().data();
    int count = columns().count();
    double sum = 0;
    for (int i = 0; i < points.size(); i++) {
      double product = data[row * count + i] * data[column * count + i];
      sum += square ? product * product : product;
    }
    return sum / points.size();
  }
}

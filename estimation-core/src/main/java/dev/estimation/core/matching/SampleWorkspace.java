package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/** Carries moments by points whose own mean is not 0 and covariance not I, about their means. */
class SampleWorkspace extends PointWorkspace {
  private final WeightedColumns left;

  SampleWorkspace(
      Space input,
      Space output,
      VectorFunction function,
      UnitPoints points,
      int meanPasses,
      Form form) {
    super(input, output, function, points, meanPasses, form);
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
}

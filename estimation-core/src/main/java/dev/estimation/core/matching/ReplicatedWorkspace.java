package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;

/**
 * Carries moments by independent replicates of points; see {@link SampledWorkspace} for the formulas. A
 * replicate may be a single draw.
 */
final class ReplicatedWorkspace extends SampleWorkspace implements SampledWorkspace {
  private final int replicates;
  private final int size;
  private final double[] pointMean;

  ReplicatedWorkspace(
      Space input,
      Space output,
      VectorFunction function,
      UnitPoints points,
      int meanPasses,
      Form form) {
    super(input, output, function, points, meanPasses, form);
    this.replicates = points.replicates();
    this.size = points.size() / replicates;
    this.pointMean = new double[points.dimension()];
    for (int r = 0; r < replicates; r++) {
      for (int axis = 0; axis < pointMean.length; axis++) {
        pointMean[axis] += pointMean(r, axis) / replicates;
      }
    }
  }

  /** Adds columns that give P_zz back what the pooled mean, by its own scatter, has taken from it. */
  @Override
  MatchingStatus match(double[] mean, double[] given, Use use, double[] outputMean) {
    MatchingStatus matched = super.match(mean, given, use, outputMean);
    if (matched == MatchingStatus.MATCHED && size > 1) {
      int count = columns().count();
      for (int c = 0; c < shift.length; c++) {
        for (int r = 0; r < replicates; r++) {
          columns().data()[c * count + points.size() + r] = offset(r, c);
        }
      }
    }
    return matched;
  }

  /** The same for W. */
  @Override
  void fillCross(double[] w) {
    super.fillCross(w);
    int m = shift.length;
    double weight = size > 1 ? 1 / (replicates * (replicates - 1.0)) : 0;
    for (int r = 0; r < replicates; r++) {
      for (int axis = 0; axis < pointMean.length; axis++) {
        double factor = weight * (pointMean(r, axis) - pointMean[axis]);
        for (int c = 0; c < m; c++) {
          w[axis * m + c] += factor * offset(r, c);
        }
      }
    }
  }

  /** The mean of a coordinate over a replicate. */
  private double pointMean(int replicate, int axis) {
    double sum = 0;
    int end = points.start((replicate + 1) * size);
    for (int entry = points.start(replicate * size); entry < end; entry++) {
      sum += points.axis(entry) == axis ? points.coordinate(entry) : 0;
    }
    return sum / size;
  }

  /** The mean of a component over a replicate, less that over all. */
  private double offset(int replicate, int component) {
    double[] data = columns().data();
    int at = component * columns().count() + replicate * size;
    double sum = 0;
    for (int i = at; i < at + size; i++) {
      sum += data[i];
    }
    return sum / size;
  }

  /** The mean of e_r e_c over a replicate. */
  private double product(int replicate, int row, int column) {
    double[] data = columns().data();
    int count = columns().count();
    double sum = 0;
    for (int i = replicate * size; i < (replicate + 1) * size; i++) {
      sum += data[row * count + i] * data[column * count + i];
    }
    return sum / size;
  }

  @Override
  public int replicates() {
    return replicates;
  }

  @Override
  public double meanStandardError(int row) {
    double squares = 0;
    for (int r = 0; r < replicates; r++) {
      double error = offset(r, row);
      squares += error * error;
    }
    return standardError(squares);
  }

  @Override
  public double covarianceStandardError(int row, int column) {
    double mean = 0;
    for (int r = 0; r < replicates; r++) {
      mean += product(r, row, column) / replicates;
    }
    double squares = 0;
    for (int r = 0; r < replicates; r++) {
      double error = product(r, row, column) - mean;
      squares += error * error;
    }
    return standardError(squares);
  }

  /** The deviation of R numbers over sqrt R, from their squared errors. */
  private double standardError(double squares) {
    return Math.sqrt(squares / (replicates - 1.0) / replicates);
  }
}

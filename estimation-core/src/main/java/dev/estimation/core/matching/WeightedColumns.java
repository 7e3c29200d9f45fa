package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Householder;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;

/**
 * A covariance as a weighted sum of squares of columns, C D C', with additive noise. {@link #data()} is
 * row by row: inner loops run over columns, of which there are many, not over the few components.
 */
final class WeightedColumns {
  private final int rows;
  private final double[] weights;
  private final double[] data;
  private final Form form;
  private final int positives;
  private final double[] scaled;
  private final double[] column;
  private final int[] lowerIndices;
  private final double[] zeros;

  WeightedColumns(int rows, double[] weights, Form form) {
    this.rows = rows;
    this.weights = weights;
    this.data = new double[rows * weights.length];
    this.form = form;
    int count = 0;
    for (double weight : weights) {
      count += weight > 0 ? 1 : 0;
    }
    this.positives = count;
    this.scaled = new double[form == Form.SQUARE_ROOT ? rows * count : 0];
    this.column = new double[rows];
    this.lowerIndices = SymmetricMatrix.lowerIndices(rows);
    this.zeros = new double[rows * rows];
  }

  /** Component c of column i stands at c * count() + i. */
  double[] data() {
    return data;
  }

  double[] weights() {
    return weights;
  }

  int count() {
    return weights.length;
  }

  /**
   * Fills a covariance, or its factor, with C D C' + noise.
   *
   * @param noise or null
   * @return MATCHED, OUTPUT_NOT_FINITE, or OUTPUT_NOT_DEFINITE if it is to be a factor and there is none
   */
  MatchingStatus fill(Covariance noise, Covariance result) {
    if (form == Form.SQUARE_ROOT) {
      return fillFactor(noise, result.changeFactor().data);
    }
    double[] lower = result.changeLowerTriangle().data;
    Products.fillOuterProduct(data, weights, rows, weights.length, lower);
    double zero = 0;
    double[] added = noise == null ? zeros : noise.lowerTriangle().data;
    for (int at : lowerIndices) {
      lower[at] += added[at];
      zero += lower[at] * 0; // NaN unless finite
    }
    return zero == 0 ? MatchingStatus.MATCHED : MatchingStatus.OUTPUT_NOT_FINITE;
  }

  private MatchingStatus fillFactor(Covariance noise, double[] lower) {
    for (int i = 0; i < rows * rows; i++) {
      lower[i] = noise == null ? 0 : noise.lowerFactor().data[i];
    }
    int at = 0;
    for (int r = 0; r < rows; r++) {
      for (int i = 0; i < weights.length; i++) {
        if (weights[i] > 0) {
          scaled[at++] = Math.sqrt(weights[i]) * data[r * weights.length + i];
        }
      }
    }
    Householder.reduceLower(lower, rows, scaled, rows, positives);
    if (!Checks.allFinite(lower)) {
      return MatchingStatus.OUTPUT_NOT_FINITE;
    }
    for (int i = 0; i < weights.length; i++) {
      if (weights[i] < 0 && !subtractColumn(i, lower)) {
        return MatchingStatus.OUTPUT_NOT_DEFINITE;
      }
    }
    return MatchingStatus.MATCHED;
  }

  private boolean subtractColumn(int i, double[] lower) {
    double root = Math.sqrt(-weights[i]);
    for (int r = 0; r < rows; r++) {
      column[r] = root * data[r * weights.length + i];
    }
    return Householder.downdate(lower, rows, column);
  }
}

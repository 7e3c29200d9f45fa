package dev.estimation.core.gaussian;

import java.util.List;
import org.ejml.data.DMatrixRMaj;

/**
 * One independent equation of a displacement e: h e = value + deviation w, w ~ N(0, 1). A deviation of zero makes
 * it exact. Immutable.
 */
final class LinearEquation {
  private final double[] coefficients;
  private final double value;
  private final double deviation;
  private final double size;
  private final int source;

  /**
   * An equation.
   *
   * @param coefficients h, kept
   * @param value what h e is expected to be
   * @param deviation 0 or more
   * @param size how large the numbers are of which the value is a difference
   * @param source which estimate it comes from, counted from 0
   */
  LinearEquation(double[] coefficients, double value, double deviation, double size, int source) {
    this.coefficients = coefficients;
    this.value = value;
    this.deviation = deviation;
    this.size = size;
    this.source = source;
  }

  double[] coefficients() {
    return coefficients;
  }

  double value() {
    return value;
  }

  double deviation() {
    return deviation;
  }

  double size() {
    return size;
  }

  int source() {
    return source;
  }

  /**
   * Splits H e = y + v, v ~ N(0, P), into independent equations. With P = L L' = C D C', C unit lower triangular, they
   * are the rows of C^-1 H e = C^-1 y + D^(1/2) w; a zero pivot gives an exact one.
   *
   * @param rows H and y, each equation with a deviation yet unknown
   * @param covariance P, factored
   * @param target takes the equations
   */
  static void split(List<LinearEquation> rows, Covariance covariance, List<LinearEquation> target) {
    DMatrixRMaj lower = covariance.lowerFactor();
    int start = target.size();
    for (int q = 0; q < rows.size(); q++) {
      LinearEquation row = rows.get(q);
      double[] h = row.coefficients.clone();
      double value = row.value;
      double size = row.size;
      for (int c = 0; c < q; c++) {
        if (lower.get(q, c) != 0) {
          LinearEquation earlier = target.get(start + c);
          double factor = lower.get(q, c) / earlier.deviation;
          for (int i = 0; i < h.length; i++) {
            h[i] -= factor * earlier.coefficients[i];
          }
          value -= factor * earlier.value;
          size += Math.abs(factor) * earlier.size;
        }
      }
      target.add(new LinearEquation(h, value, lower.get(q, q), size, row.source));
    }
  }

  /** The largest coefficient in units of the deviation, or as it is if the equation is exact. */
  double weight(int component) {
    return Math.abs(coefficients[component]) / (deviation > 0 ? deviation : 1);
  }
}

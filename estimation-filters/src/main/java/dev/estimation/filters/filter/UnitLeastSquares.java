package dev.estimation.filters.filter;

import dev.estimation.core.internal.Householder;
import dev.estimation.core.internal.LowerFactor;
import org.ejml.data.DMatrixRMaj;

/**
 * An update in unit coordinates s of the prior, x = m + B s, s ~ N(0, I): with W' s the part of the
 * measurement that s explains and T = L L' the covariance of the rest, the least squares of L^-1 (y - W'
 * s) and s. Solved by an orthogonal reduction of [L^-1 W', L^-1 y; I, 0] to [R, z]: s = R^-1 z, of
 * covariance (R'R)^-1. No covariance is subtracted from another, so a prior of 100 km and a
 * measurement of 1 m keep their digits. Confined to one thread.
 */
final class UnitLeastSquares {
  private final int k;
  private final int m;
  private final int width;
  private final double[] stack;
  private final double[] column;

  UnitLeastSquares(int unitDimension, int measurementDimension) {
    this.k = unitDimension;
    this.m = measurementDimension;
    this.width = k + 1;
    this.stack = new double[(m + k) * width];
    this.column = new double[m];
  }

  /**
   * Sets the problem and reduces it.
   *
   * @param cross W, k x m
   * @param unexplained the factor L of T
   * @param target y, read
   */
  void reduce(DMatrixRMaj cross, LowerFactor unexplained, double[] target) {
    for (int a = 0; a <= k; a++) {
      System.arraycopy(a < k ? cross.data : target, a < k ? a * m : 0, column, 0, m);
      unexplained.solveLower(column);
      for (int j = 0; j < m; j++) {
        stack[j * width + a] = column[j];
      }
      for (int r = 0; r < k; r++) {
        stack[(m + r) * width + a] = r == a ? 1 : 0;
      }
    }
    Householder.triangularise(stack, m + k, width, k);
  }

  /** Fills s with R^-1 z. */
  void solve(double[] s) {
    for (int r = k - 1; r >= 0; r--) {
      double sum = stack[r * width + k];
      for (int c = r + 1; c < k; c++) {
        sum -= stack[r * width + c] * s[c];
      }
      s[r] = sum / stack[r * width + r];
    }
  }

  /** The square of what the solution leaves of L^-1 y: y' (T + W'W)^-1 y. */
  double restSquared() {
    double sum = 0;
    for (int i = k; i < m + k; i++) {
      double rest = stack[i * width + k];
      sum += rest * rest;
    }
    return sum;
  }

  /** ln det R'R. */
  double logDeterminant() {
    double sum = 0;
    for (int r = 0; r < k; r++) {
      sum += Math.log(Math.abs(stack[r * width + r]));
    }
    return 2 * sum;
  }

  /** z, of which B s is D' z. */
  double target(int row) {
    return stack[row * width + k];
  }

  /**
   * Fills D = R^-T B', of which B (R'R)^-1 B' is D'D.
   *
   * @param b B, n x k
   * @param rows filled, k x n
   */
  void fillRoot(DMatrixRMaj b, double[] rows) {
    int n = b.numRows;
    for (int c = 0; c < k; c++) {
      double scale = 1 / stack[c * width + c];
      for (int r = 0; r < n; r++) {
        rows[c * n + r] = b.data[r * k + c];
      }
      for (int q = 0; q < c; q++) {
        double factor = stack[q * width + c];
        for (int r = 0; r < n; r++) {
          rows[c * n + r] -= factor * rows[q * n + r];
        }
      }
      for (int r = 0; r < n; r++) {
        rows[c * n + r] *= scale;
      }
    }
  }
}

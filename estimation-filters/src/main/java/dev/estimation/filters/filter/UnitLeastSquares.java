package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.internal.Householder;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * An update in unit coordinates s of the prior, x = m + B s, s ~ N(0, I): with W' s the part of the
 * measurement that s explains and T = L L' the covariance of the rest, the least squares of L^-1 (y - W'
 * s) and s. With A = W L^-T the reduction [I A; 0 (L^-1 y)'] Q = [U 0; z' r'], U upper triangular, gives the
 * covariance (I + A A')^-1 = U^-T U^-1 of s, its mean U^-T z, and what is left, r. No covariance is subtracted
 * from another, so a prior of 100 km and a measurement of 1 m keep their digits; and B U^-T is lower
 * triangular where B is. Confined to one thread.
 */
final class UnitLeastSquares {
  private final int k;
  private final int m;
  private final double[] triangle;
  private final double[] block;
  private final double[] inverse;
  private final double[] column;

  UnitLeastSquares(int unitDimension, int measurementDimension) {
    this.k = unitDimension;
    this.m = measurementDimension;
    this.triangle = new double[(k + 1) * k];
    this.block = new double[(k + 1) * m];
    this.inverse = new double[k];
    this.column = new double[m];
  }

  /**
   * Sets the problem and reduces it.
   *
   * @param cross W, k x m
   * @param unexplained T, definite
   * @param target y, read
   */
  void reduce(DMatrixRMaj cross, Covariance unexplained, double[] target) {
    Arrays.fill(triangle, 0);
    for (int a = 0; a < k; a++) {
      triangle[a * (k + 1)] = 1;
    }
    for (int a = 0; a <= k; a++) {
      System.arraycopy(a < k ? cross.data : target, a < k ? a * m : 0, column, 0, m);
      unexplained.solveLower(column);
      System.arraycopy(column, 0, block, a * m, m);
    }
    Householder.reduceUpper(triangle, k, block, k + 1, m);
    for (int a = 0; a < k; a++) {
      inverse[a] = 1 / triangle[a * (k + 1)];
    }
  }

  /** Fills s with U^-T z. */
  void solve(double[] s) {
    for (int r = 0; r < k; r++) {
      double sum = target(r);
      for (int c = 0; c < r; c++) {
        sum -= triangle[c * k + r] * s[c];
      }
      s[r] = sum * inverse[r];
    }
  }

  /** The square of what the solution leaves of L^-1 y: y' (T + W'W)^-1 y. */
  double restSquared() {
    double sum = 0;
    for (int i = k * m; i < block.length; i++) {
      sum += block[i] * block[i];
    }
    return sum;
  }

  /** ln det U U'. */
  double logDeterminant() {
    double sum = 0;
    for (int r = 0; r < k; r++) {
      sum += Math.log(triangle[r * (k + 1)]);
    }
    return 2 * sum;
  }

  /** z, of which B s is B U^-T z. */
  double target(int column) {
    return triangle[k * k + column];
  }

  /**
   * Replaces the first k columns of the input's factor, B, by B U^-T, row by row.
   *
   * @param factor [B E], n x n, read
   * @param n rows
   * @param result filled with [B U^-T, E], n x n
   */
  void fillRoot(double[] factor, int n, double[] result) {
    System.arraycopy(factor, 0, result, 0, n * n);
    for (int at = 0; at < n * n; at += n) {
      for (int q = k - 1; q >= 0; q--) {
        double sum = result[at + q];
        for (int c = q + 1; c < k; c++) {
          sum -= result[at + c] * triangle[q * k + c];
        }
        result[at + q] = sum * inverse[q];
      }
    }
  }
}

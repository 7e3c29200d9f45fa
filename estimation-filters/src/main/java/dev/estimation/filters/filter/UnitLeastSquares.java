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

  UnitLeastSquares(int unitDimension, int measurementDimension) {
    this.k = unitDimension;
    this.m = measurementDimension;
    this.triangle = new double[(k + 1) * k];
    this.block = new double[(k + 1) * m];
    this.inverse = new double[k];
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
    System.arraycopy(cross.data, 0, block, 0, k * m);
    System.arraycopy(target, 0, block, k * m, m);
    whiten(unexplained.lowerFactor().data);
    Householder.reduceUpper(triangle, k, block, k + 1, m);
    for (int a = 0; a < k; a++) {
      inverse[a] = 1 / triangle[a * (k + 1)];
    }
  }

  /** Multiplies the rows of the block by L^-T from the right, column by column. */
  private void whiten(double[] lower) {
    for (int j = 0; j < m; j++) {
      for (int i = 0; i < j; i++) {
        double factor = lower[j * m + i];
        for (int at = 0; at < block.length; at += m) {
          block[at + j] -= factor * block[at + i];
        }
      }
      double scale = 1 / lower[j * m + j];
      for (int at = j; at < block.length; at += m) {
        block[at] *= scale;
      }
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

  /** Whether U is finite: its diagonal has the length of each row. */
  boolean isFinite() {
    double zero = 0;
    for (int a = 0; a < k; a++) {
      zero += triangle[a * (k + 1)] * 0;
    }
    return zero == 0;
  }

  /** z, of which B s is B U^-T z. */
  double target(int column) {
    return triangle[k * k + column];
  }

  /**
   * Replaces the first k columns of the input's factor, B, by B U^-T, column by column.
   *
   * @param factor [B E], n x n, read
   * @param n rows
   * @param result filled with [B U^-T, E], n x n
   */
  void fillRoot(double[] factor, int n, double[] result) {
    System.arraycopy(factor, 0, result, 0, n * n);
    for (int q = k - 1; q >= 0; q--) {
      for (int c = q + 1; c < k; c++) {
        double entry = triangle[q * k + c];
        for (int at = 0; at < n * n; at += n) {
          result[at + q] -= result[at + c] * entry;
        }
      }
      double scale = inverse[q];
      for (int at = q; at < n * n; at += n) {
        result[at] *= scale;
      }
    }
  }
}

package dev.estimation.core.internal;

/**
 * Products of small dense matrices on flat arrays, row by row, where a general library's calls cost
 * more than the arithmetic (measured by {@code KernelBenchmark}). No shape is checked.
 */
public final class Products {
  private Products() {}

  /**
   * Adds weight v v' to the lower triangle of a symmetric matrix.
   *
   * @param weight any number
   * @param v m numbers, read
   * @param lower m x m, updated on and below the diagonal
   */
  public static void addSquare(double weight, double[] v, double[] lower) {
    int m = v.length;
    for (int r = 0; r < m; r++) {
      double weighted = weight * v[r];
      for (int c = 0; c <= r; c++) {
        lower[r * m + c] += weighted * v[c];
      }
    }
  }

  /**
   * The lower triangle of A'A.
   *
   * @param a k x m, read
   * @param k rows
   * @param m columns
   * @param lower m x m, filled on and below the diagonal
   */
  public static void fillInnerProduct(double[] a, int k, int m, double[] lower) {
    for (int r = 0; r < m; r++) {
      for (int c = 0; c <= r; c++) {
        double sum = 0;
        for (int i = 0; i < k; i++) {
          sum += a[i * m + r] * a[i * m + c];
        }
        lower[r * m + c] = sum;
      }
    }
  }

  /**
   * The lower triangle of P - A A'.
   *
   * @param p n x n, symmetric, read
   * @param a n x m, read
   * @param n rows
   * @param m columns of A
   * @param lower n x n, filled on and below the diagonal
   */
  public static void fillDifference(double[] p, double[] a, int n, int m, double[] lower) {
    for (int r = 0; r < n; r++) {
      for (int c = 0; c <= r; c++) {
        double sum = p[r * n + c];
        for (int i = 0; i < m; i++) {
          sum -= a[r * m + i] * a[c * m + i];
        }
        lower[r * n + c] = sum;
      }
    }
  }
}

package dev.estimation.core.internal;

/**
 * Products of small dense matrices on flat arrays, row by row, where a general library's calls cost
 * more than the arithmetic (measured by {@code KernelBenchmark}). No shape is checked.
 *
 * <p>Sums are formed in blocks of two by two entries: that many sums at once hide the latency of the
 * additions, which a single running sum of so few terms cannot.
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
   * The lower triangle of A' D A, D diagonal.
   *
   * @param a k x m, read
   * @param weights the k numbers of D, read
   * @param k rows
   * @param m columns
   * @param lower m x m, filled on and below the diagonal
   */
  public static void fillInnerProduct(double[] a, double[] weights, int k, int m, double[] lower) {
    int even = m & ~1;
    for (int r = 0; r < even; r += 2) {
      for (int c = 0; c <= r; c += 2) {
        double upperLeft = 0;
        double upperRight = 0;
        double lowerLeft = 0;
        double lowerRight = 0;
        for (int i = 0, at = 0; i < k; i++, at += m) {
          double first = weights[i] * a[at + r];
          double second = weights[i] * a[at + r + 1];
          double left = a[at + c];
          double right = a[at + c + 1];
          upperLeft += first * left;
          upperRight += first * right;
          lowerLeft += second * left;
          lowerRight += second * right;
        }
        lower[r * m + c] = upperLeft;
        lower[(r + 1) * m + c] = lowerLeft;
        lower[(r + 1) * m + c + 1] = lowerRight;
        if (c < r) {
          lower[r * m + c + 1] = upperRight;
        }
      }
    }
    if (even < m) {
      fillLastRow(a, weights, k, m, lower);
    }
  }

  private static void fillLastRow(double[] a, double[] weights, int k, int m, double[] lower) {
    int r = m - 1;
    for (int c = 0; c < r; c += 2) {
      double left = 0;
      double right = 0;
      for (int i = 0, at = 0; i < k; i++, at += m) {
        double last = weights[i] * a[at + r];
        left += last * a[at + c];
        right += last * a[at + c + 1];
      }
      lower[r * m + c] = left;
      lower[r * m + c + 1] = right;
    }
    double sum = 0;
    for (int i = 0, at = r; i < k; i++, at += m) {
      sum += weights[i] * a[at] * a[at];
    }
    lower[r * m + r] = sum;
  }
}

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
   * The lower triangle of A D A', D diagonal.
   *
   * @param a m x p, read
   * @param weights the p numbers of D, read
   * @param m rows
   * @param p columns
   * @param lower m x m, filled on and below the diagonal
   */
  public static void fillOuterProduct(double[] a, double[] weights, int m, int p, double[] lower) {
    int r = 0;
    for (; r + 1 < m; r += 2) {
      int first = r * p;
      int second = first + p;
      int c = 0;
      for (; c < r; c += 2) {
        int left = c * p;
        int right = left + p;
        double upperLeft = 0;
        double upperRight = 0;
        double lowerLeft = 0;
        double lowerRight = 0;
        for (int i = 0; i < p; i++) {
          double upper = weights[i] * a[first + i];
          double below = weights[i] * a[second + i];
          upperLeft += upper * a[left + i];
          upperRight += upper * a[right + i];
          lowerLeft += below * a[left + i];
          lowerRight += below * a[right + i];
        }
        lower[r * m + c] = upperLeft;
        lower[r * m + c + 1] = upperRight;
        lower[(r + 1) * m + c] = lowerLeft;
        lower[(r + 1) * m + c + 1] = lowerRight;
      }
      double upperLeft = 0;
      double lowerLeft = 0;
      double lowerRight = 0;
      for (int i = 0; i < p; i++) {
        double upper = weights[i] * a[first + i];
        upperLeft += upper * a[first + i];
        lowerLeft += upper * a[second + i];
        lowerRight += weights[i] * a[second + i] * a[second + i];
      }
      lower[r * m + r] = upperLeft;
      lower[(r + 1) * m + r] = lowerLeft;
      lower[(r + 1) * m + r + 1] = lowerRight;
    }
    if (r < m) {
      fillLastRow(a, weights, m, p, lower);
    }
  }

  /**
   * The sum of the squares of all numbers.
   *
   * @param a read
   * @return the sum
   */
  public static double sumOfSquares(double[] a) {
    double even = 0;
    double odd = 0;
    int i = 0;
    for (; i + 1 < a.length; i += 2) {
      even += a[i] * a[i];
      odd += a[i + 1] * a[i + 1];
    }
    return i < a.length ? even + odd + a[i] * a[i] : even + odd;
  }

  private static void fillLastRow(double[] a, double[] weights, int m, int p, double[] lower) {
    int last = (m - 1) * p;
    for (int c = 0; c + 1 < m; c += 2) {
      double left = 0;
      double right = 0;
      for (int i = 0; i < p; i++) {
        double weighted = weights[i] * a[last + i];
        left += weighted * a[c * p + i];
        right += weighted * a[c * p + p + i];
      }
      lower[(m - 1) * m + c] = left;
      lower[(m - 1) * m + c + 1] = right;
    }
    double sum = 0;
    for (int i = 0; i < p; i++) {
      sum += weights[i] * a[last + i] * a[last + i];
    }
    lower[m * m - 1] = sum;
  }
}

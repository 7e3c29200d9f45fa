package dev.estimation.core.internal;

/**
 * Products of small dense matrices on flat arrays, row by row, where a general library's calls cost
 * more than the arithmetic (measured by {@code KernelBenchmark}). No shape is checked.
 *
 * <p>Up to ten sums are formed at once: that many hide the latency of the additions, which a single running sum of
 * so few terms cannot, and one loop does the work of ten.
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
    for (; r + 3 < m; r += 4) {
      fillLeft(a, weights, m, p, lower, r, r + 4);
      fillFour(a, weights, m, p, lower, r);
    }
    fillLeft(a, weights, m, p, lower, r, m);
    switch (m - r) {
      case 3 -> fillThree(a, weights, m, p, lower, r);
      case 2 -> fillTwo(a, weights, m, p, lower, r);
      case 1 -> fillOne(a, weights, m, p, lower, r);
      default -> {}
    }
  }

  /** Rows from r to end, against those of all blocks of four before r. */
  private static void fillLeft(
      double[] a, double[] weights, int m, int p, double[] lower, int r, int end) {
    for (int row = r; row < end; row++) {
      for (int c = 0; c < r; c += 4) {
        int at = row * p;
        int first = c * p;
        double sum0 = 0;
        double sum1 = 0;
        double sum2 = 0;
        double sum3 = 0;
        for (int i = 0; i < p; i++) {
          double weighted = weights[i] * a[at + i];
          sum0 += weighted * a[first + i];
          sum1 += weighted * a[first + p + i];
          sum2 += weighted * a[first + 2 * p + i];
          sum3 += weighted * a[first + 3 * p + i];
        }
        lower[row * m + c] = sum0;
        lower[row * m + c + 1] = sum1;
        lower[row * m + c + 2] = sum2;
        lower[row * m + c + 3] = sum3;
      }
    }
  }

  private static void fillFour(double[] a, double[] weights, int m, int p, double[] lower, int r) {
    int at0 = r * p;
    int at1 = at0 + p;
    int at2 = at1 + p;
    int at3 = at2 + p;
    double sum00 = 0;
    double sum10 = 0;
    double sum11 = 0;
    double sum20 = 0;
    double sum21 = 0;
    double sum22 = 0;
    double sum30 = 0;
    double sum31 = 0;
    double sum32 = 0;
    double sum33 = 0;
    for (int i = 0; i < p; i++) {
      double weight = weights[i];
      double a0 = a[at0 + i];
      double a1 = a[at1 + i];
      double a2 = a[at2 + i];
      double a3 = a[at3 + i];
      double weighted = weight * a0;
      sum00 += weighted * a0;
      sum10 += weighted * a1;
      sum20 += weighted * a2;
      sum30 += weighted * a3;
      weighted = weight * a1;
      sum11 += weighted * a1;
      sum21 += weighted * a2;
      sum31 += weighted * a3;
      weighted = weight * a2;
      sum22 += weighted * a2;
      sum32 += weighted * a3;
      sum33 += weight * a3 * a3;
    }
    int row = r * (m + 1);
    lower[row] = sum00;
    lower[row += m] = sum10;
    lower[row + 1] = sum11;
    lower[row += m] = sum20;
    lower[row + 1] = sum21;
    lower[row + 2] = sum22;
    lower[row += m] = sum30;
    lower[row + 1] = sum31;
    lower[row + 2] = sum32;
    lower[row + 3] = sum33;
  }

  private static void fillThree(double[] a, double[] weights, int m, int p, double[] lower, int r) {
    int at0 = r * p;
    int at1 = at0 + p;
    int at2 = at1 + p;
    double sum00 = 0;
    double sum10 = 0;
    double sum11 = 0;
    double sum20 = 0;
    double sum21 = 0;
    double sum22 = 0;
    for (int i = 0; i < p; i++) {
      double weight = weights[i];
      double a0 = a[at0 + i];
      double a1 = a[at1 + i];
      double a2 = a[at2 + i];
      double weighted = weight * a0;
      sum00 += weighted * a0;
      sum10 += weighted * a1;
      sum20 += weighted * a2;
      weighted = weight * a1;
      sum11 += weighted * a1;
      sum21 += weighted * a2;
      sum22 += weight * a2 * a2;
    }
    int row = r * (m + 1);
    lower[row] = sum00;
    lower[row += m] = sum10;
    lower[row + 1] = sum11;
    lower[row += m] = sum20;
    lower[row + 1] = sum21;
    lower[row + 2] = sum22;
  }

  private static void fillTwo(double[] a, double[] weights, int m, int p, double[] lower, int r) {
    int at0 = r * p;
    int at1 = at0 + p;
    double sum00 = 0;
    double sum10 = 0;
    double sum11 = 0;
    for (int i = 0; i < p; i++) {
      double weighted = weights[i] * a[at0 + i];
      sum00 += weighted * a[at0 + i];
      sum10 += weighted * a[at1 + i];
      sum11 += weights[i] * a[at1 + i] * a[at1 + i];
    }
    int row = r * (m + 1);
    lower[row] = sum00;
    lower[row + m] = sum10;
    lower[row + m + 1] = sum11;
  }

  private static void fillOne(double[] a, double[] weights, int m, int p, double[] lower, int r) {
    int at = r * p;
    double sum = 0;
    for (int i = 0; i < p; i++) {
      sum += weights[i] * a[at + i] * a[at + i];
    }
    lower[r * (m + 1)] = sum;
  }
}

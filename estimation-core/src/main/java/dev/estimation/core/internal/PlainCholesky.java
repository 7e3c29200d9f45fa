package dev.estimation.core.internal;

/**
 * The lower Cholesky factor of a matrix far from singular, three columns at a time: of so few rows, loops would
 * cost more than the arithmetic in them. No shape is checked; used by {@link LowerFactor}, which looks closer
 * where this gives up.
 */
final class PlainCholesky {
  private PlainCholesky() {}

  /**
   * Factors in place.
   *
   * @param l n x n, the matrix on and below the diagonal, updated; in part if the result is false
   * @param n rows
   * @param least for each row, what its pivot must exceed
   * @return false if a pivot does not, or is not finite
   */
  static boolean factor(double[] l, int n, double[] least) {
    int j = 0;
    for (; j + 2 < n; j += 3) {
      if (!factorThree(l, n, least, j)) {
        return false;
      }
    }
    return j == n || (j + 1 == n ? factorOne(l, n, least, j) : factorTwo(l, n, least, j));
  }

  private static boolean isLarge(double pivot, double least) {
    return pivot > least && pivot <= Double.MAX_VALUE;
  }

  private static boolean factorOne(double[] l, int n, double[] least, int j) {
    double pivot = l[j * n + j];
    l[j * n + j] = Math.sqrt(pivot);
    return isLarge(pivot, least[j]);
  }

  private static boolean factorTwo(double[] l, int n, double[] least, int j) {
    int first = j * n + j;
    int second = first + n;
    double pivot = l[first];
    double root = Math.sqrt(pivot);
    double below = l[second] * (root * (1 / pivot));
    double next = l[second + 1] - below * below;
    l[first] = root;
    l[second] = below;
    l[second + 1] = Math.sqrt(next);
    return isLarge(pivot, least[j]) && isLarge(next, least[j + 1]);
  }

  /** Three columns, and what they take from those to the right. Nothing but the results waits for roots. */
  private static boolean factorThree(double[] l, int n, double[] least, int j) {
    int first = j * n + j;
    int second = first + n;
    int third = second + n;
    double pivot0 = l[first];
    double reciprocal0 = 1 / pivot0;
    double a10 = l[second];
    double a20 = l[third];
    double pivot1 = l[second + 1] - a10 * a10 * reciprocal0;
    double reciprocal1 = 1 / pivot1;
    double a21 = l[third + 1] - a20 * a10 * reciprocal0;
    double pivot2 = l[third + 2] - a20 * a20 * reciprocal0 - a21 * a21 * reciprocal1;
    double root0 = Math.sqrt(pivot0);
    double root1 = Math.sqrt(pivot1);
    double root2 = Math.sqrt(pivot2);
    double inverse0 = root0 * reciprocal0;
    double inverse1 = root1 * reciprocal1;
    double l10 = a10 * inverse0;
    double l20 = a20 * inverse0;
    double l21 = a21 * inverse1;
    if (!(isLarge(pivot0, least[j])
        && isLarge(pivot1, least[j + 1])
        && isLarge(pivot2, least[j + 2]))) {
      return false;
    }
    l[first] = root0;
    l[second] = l10;
    l[second + 1] = root1;
    l[third] = l20;
    l[third + 1] = l21;
    l[third + 2] = root2;
    double inverse2 = root2 * (1 / pivot2);
    for (int r = j + 3; r < n; r++) {
      int row = r * n + j;
      double x0 = l[row] * inverse0;
      double x1 = (l[row + 1] - x0 * l10) * inverse1;
      double x2 = (l[row + 2] - x0 * l20 - x1 * l21) * inverse2;
      l[row] = x0;
      l[row + 1] = x1;
      l[row + 2] = x2;
      for (int c = j + 3; c <= r; c++) {
        int other = c * n + j;
        l[r * n + c] -= x0 * l[other] + x1 * l[other + 1] + x2 * l[other + 2];
      }
    }
    return true;
  }
}

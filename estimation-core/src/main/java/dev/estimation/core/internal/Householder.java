package dev.estimation.core.internal;

/**
 * Orthogonal reduction of small matrices that are triangular in part, in place and without choice of
 * pivots: [T A] Q = [T' 0] with T and T' triangular, so that T'T'' = T T' + A A'. What it saves over
 * sums of squares is half of the digits: a matrix of condition 1e5 loses 5 of them, not 10.
 *
 * <p>Each reflection touches one column of T and all of A; diagonals stay zero or above. Squares of the entries
 * must neither overflow nor vanish. All arrays are row by row; no shape is checked.
 */
public final class Householder {
  private Householder() {}

  /**
   * Reduces [L A] to [L' 0], L lower triangular. Rows beyond those of the triangle are turned with the
   * others.
   *
   * @param l rows x reduced, lower triangular in the first rows with no negative diagonal, updated
   * @param reduced columns of L
   * @param a rows x columns, updated; what remains in the first rows is scratch
   * @param rows at least {@code reduced}
   * @param columns of A
   */
  public static void reduceLower(double[] l, int reduced, double[] a, int rows, int columns) {
    for (int j = 0; j < reduced; j++) {
      double head = turnPivot(l, reduced, a, columns, j);
      if (head != 0) {
        turnRows(l, reduced, a, columns, j, head, j + 1, rows);
      }
    }
  }

  /**
   * Reduces [U A] to [U' 0], U upper triangular, from its last row to its first. Rows beyond those of the
   * triangle are turned with the others.
   *
   * @param u rows x reduced, upper triangular in the first rows with no negative diagonal, updated
   * @param reduced columns of U
   * @param a rows x columns, updated; what remains in the first rows is scratch
   * @param rows at least {@code reduced}
   * @param columns of A
   */
  public static void reduceUpper(double[] u, int reduced, double[] a, int rows, int columns) {
    for (int j = reduced - 1; j >= 0; j--) {
      double head = turnPivot(u, reduced, a, columns, j);
      if (head != 0) {
        turnRows(u, reduced, a, columns, j, head, 0, j);
        turnRows(u, reduced, a, columns, j, head, reduced, rows);
      }
    }
  }

  /**
   * Sets the new diagonal entry of row j and returns the head of v = (old entry + new entry, row j of A); 0 if
   * that row is zero already. The reflection is I - v v' 2 / v'v, its first component negated, so that the
   * diagonal stays positive.
   */
  private static double turnPivot(double[] t, int width, double[] a, int columns, int j) {
    int at = j * columns;
    double square = 0;
    for (int i = 0; i < columns; i++) {
      square += a[at + i] * a[at + i];
    }
    if (square == 0) {
      return 0;
    }
    int diagonal = j * width + j;
    double pivot = t[diagonal];
    double length = Math.sqrt(pivot * pivot + square);
    t[diagonal] = length;
    return pivot + length;
  }

  private static void turnRows(
      double[] t, int width, double[] a, int columns, int j, double head, int from, int to) {
    int tail = j * columns;
    double scale = 1 / (t[j * width + j] * head);
    for (int r = from; r < to; r++) {
      int at = r * columns;
      double entry = t[r * width + j];
      double sum = entry * head;
      for (int i = 0; i < columns; i++) {
        sum += a[at + i] * a[tail + i];
      }
      double factor = scale * sum;
      t[r * width + j] = factor * head - entry;
      for (int i = 0; i < columns; i++) {
        a[at + i] -= factor * a[tail + i];
      }
    }
  }

  /**
   * Replaces L by the factor of L L' - v v', where that is positive semi-definite. Loses digits where little is
   * left, as no subtraction can help; says so where nothing is.
   *
   * @param l n x n, lower triangular, updated; in part if the result is false
   * @param n rows
   * @param v n numbers, updated
   * @return false if a pivot would not be real
   */
  public static boolean downdate(double[] l, int n, double[] v) {
    for (int j = 0; j < n; j++) {
      double pivot = l[j * n + j];
      double square = (pivot - v[j]) * (pivot + v[j]);
      if (v[j] == 0) {
        continue;
      }
      if (!(square > 0)) {
        l[j * n + j] = Double.NaN; // so that nobody takes the rest for a factor
        return false;
      }
      double root = Math.sqrt(square);
      double cosine = root / pivot;
      double sine = v[j] / pivot;
      l[j * n + j] = root;
      for (int r = j + 1; r < n; r++) {
        double entry = (l[r * n + j] - sine * v[r]) / cosine;
        l[r * n + j] = entry;
        v[r] = cosine * v[r] - sine * entry;
      }
    }
    return true;
  }
}

package dev.estimation.core.gaussian;

import dev.estimation.core.internal.RowOrder;

/**
 * Orthogonal reduction with choice of columns: Q' A E = [R; 0], R upper triangular with diagonal entries that do
 * not grow. The column with the largest rest comes next, and its rest is summed anew at every step: where rows are
 * weighted by 1 and by 1e-8, a downdated sum of squares would be rounding. With rows sorted by size, largest
 * first, the errors of each row are relative to that row (Cox and Higham 1998, <i>Stability of Householder QR
 * factorization for weighted least squares problems</i>, from memory). Confined to one thread.
 */
final class PivotedReduction {
  private final double[][] matrix;
  private final double[][] right;
  private final int[] order;

  /**
   * Reduces a matrix, and turns another with it.
   *
   * @param matrix A, row by row, kept and overwritten with R E' in its first rows
   * @param right as many rows, kept and overwritten with Q' times it
   * @param columns of A
   */
  PivotedReduction(double[][] matrix, double[][] right, int columns) {
    this.matrix = matrix;
    this.right = right;
    this.order = RowOrder.natural(columns);
    for (int j = 0; j < Math.min(columns, matrix.length); j++) {
      choose(j);
      reflect(j);
    }
  }

  /** Brings the column with the largest rest to place j. */
  private void choose(int j) {
    int best = j;
    double largest = -1;
    for (int c = j; c < order.length; c++) {
      double rest = restSquared(order[c], j);
      if (rest > largest) {
        largest = rest;
        best = c;
      }
    }
    int chosen = order[best];
    order[best] = order[j];
    order[j] = chosen;
  }

  private double restSquared(int column, int from) {
    double sum = 0;
    for (int r = from; r < matrix.length; r++) {
      sum += matrix[r][column] * matrix[r][column];
    }
    return sum;
  }

  /** I - v v' / (length head), v = (head, the rest of the column): nothing cancels in head. */
  private void reflect(int j) {
    int column = order[j];
    double pivot = matrix[j][column];
    double length = Math.sqrt(restSquared(column, j));
    if (length == 0) {
      return;
    }
    double[] v = new double[matrix.length];
    for (int r = j; r < v.length; r++) {
      v[r] = matrix[r][column];
    }
    v[j] += Math.copySign(length, pivot);
    double scale = 1 / (length * Math.abs(v[j]));
    for (int c = j; c < order.length; c++) {
      turn(matrix, order[c], v, j, scale);
    }
    for (int c = 0; c < right[j].length; c++) {
      turn(right, c, v, j, scale);
    }
    for (int r = j + 1; r < v.length; r++) {
      matrix[r][column] = 0;
    }
  }

  private static void turn(double[][] a, int column, double[] v, int from, double scale) {
    double sum = 0;
    for (int r = from; r < v.length; r++) {
      sum += v[r] * a[r][column];
    }
    for (int r = from; r < v.length; r++) {
      a[r][column] -= scale * sum * v[r];
    }
  }

  /** How many diagonal entries are larger than a bound. */
  int rank(double bound) {
    int rank = 0;
    while (rank < Math.min(order.length, matrix.length) && Math.abs(entry(rank, rank)) > bound) {
      rank++;
    }
    return rank;
  }

  /** An entry of R. */
  double entry(int row, int column) {
    return matrix[row][order[column]];
  }

  /** Which column of A came to a place. */
  int column(int place) {
    return order[place];
  }
}

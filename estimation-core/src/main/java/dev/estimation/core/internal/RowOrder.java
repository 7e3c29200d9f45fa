package dev.estimation.core.internal;

import java.util.Arrays;

/**
 * Takes the rows of a lower triangular factor in another order: L with L[from, :] lower triangular becomes L'
 * with L'[to, :] lower triangular and L L' the same, by plane rotations of columns, one for each place that a row
 * moves up. No covariance is formed. Confined to one thread with the factor; allocates only when built.
 */
public final class RowOrder {
  private final int size;

  /** Each rotation: the column, where the row begins in which it makes a zero, the range of its other rows. */
  private final int[] steps;

  private final int[] rows;

  /**
   * A change of order.
   *
   * @param from a permutation of 0..n-1, read
   * @param to another, read; or its first entries, the rest as before
   */
  public RowOrder(int[] from, int[] to) {
    this.size = from.length;
    int[] order = from.clone();
    int[] allSteps = new int[2 * size * size];
    int[] allRows = new int[size * size * size];
    int step = 0;
    int row = 0;
    for (int place = 0; place < to.length; place++) {
      int old = placeOf(to[place], place, order);
      for (int column = old - 1; column >= place; column--) {
        allSteps[step++] = column;
        allSteps[step++] = to[place] * size;
        allSteps[step++] = row;
        for (int other = column; other < size; other++) {
          if (other != old) {
            allRows[row++] = order[other] * size;
          }
        }
        allSteps[step++] = row;
      }
      System.arraycopy(order, place, order, place + 1, old - place);
      order[place] = to[place];
    }
    this.steps = Arrays.copyOf(allSteps, step);
    this.rows = Arrays.copyOf(allRows, row);
  }

  private static int placeOf(int row, int from, int[] order) {
    int place = from;
    while (order[place] != row) {
      place++;
    }
    return place;
  }

  /** {@return 0, 1, ..., n-1}
   *
   * @param n how many
   */
  public static int[] natural(int n) {
    int[] order = new int[n];
    Arrays.setAll(order, i -> i);
    return order;
  }

  /**
   * Turns the columns of a factor.
   *
   * @param l n x n, rows in natural order, updated
   */
  public void apply(double[] l) {
    for (int i = 0; i < steps.length; i += 4) {
      turn(l, steps[i], steps[i + 1] + steps[i], steps[i + 2], steps[i + 3]);
    }
  }

  /**
   * Turns a column and the next so that a row has a zero in the second; where it has zeros in both, they change
   * places. A reflection, so that diagonals stay positive.
   */
  private void turn(double[] l, int column, int at, int from, int to) {
    double first = l[at];
    double second = l[at + 1];
    double square = first * first + second * second;
    double length = square > 0 ? Math.sqrt(square) : Math.hypot(first, second); // tiny ones too
    double inverse = 1 / length;
    double cosine = length == 0 ? 0 : first * inverse;
    double sine = length == 0 ? 1 : second * inverse;
    l[at] = length;
    l[at + 1] = 0;
    for (int i = from; i < to; i++) {
      int row = rows[i] + column;
      double left = l[row];
      double right = l[row + 1];
      l[row] = cosine * left + sine * right;
      l[row + 1] = sine * left - cosine * right;
    }
  }
}

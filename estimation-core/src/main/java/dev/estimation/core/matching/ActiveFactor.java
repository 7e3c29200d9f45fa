package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.LowerFactor;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * The lower factor of a covariance, the active inputs taken first: L, n x n, with P = L L', its rows in natural
 * order and L[order, :] lower triangular. Its first k columns are B, with B B' the part of P that the active
 * inputs carry; the others are what the remaining inputs have of their own. P[:, active] = B B[active, :]', so a
 * regression on the active inputs needs no division by L.
 *
 * <p>Found from the factor in natural order by plane rotations of its columns, one for each place that an
 * active input moves up; no covariance is formed.
 */
final class ActiveFactor {
  private final int[] order;
  private final int count;
  private final DMatrixRMaj factor;

  /** Each rotation: the column, the row in which it makes a zero, where its other rows begin and end. */
  private final int[] schedule;

  private final int[] rows;
  private int failedPivot;
  private double failedValue;

  ActiveFactor(int[] active, int dimension) {
    this.count = active.length;
    this.order = naturalOrder(dimension);
    int[] steps = new int[4 * dimension * dimension];
    int[] turned = new int[dimension * dimension * dimension];
    int step = 0;
    int row = 0;
    for (int place = 0; place < count; place++) {
      int from = placeOf(active[place], place);
      for (int column = from - 1; column >= place; column--) {
        steps[step++] = column;
        steps[step++] = active[place];
        steps[step++] = row;
        for (int other = column; other < dimension; other++) {
          if (other != from) {
            turned[row++] = order[other] * dimension;
          }
        }
        steps[step++] = row;
      }
      System.arraycopy(order, place, order, place + 1, from - place);
      order[place] = active[place];
    }
    this.schedule = Arrays.copyOf(steps, step);
    this.rows = Arrays.copyOf(turned, row);
    this.factor = new DMatrixRMaj(dimension, dimension);
  }

  private static int[] naturalOrder(int dimension) {
    int[] order = new int[dimension];
    Arrays.setAll(order, i -> i);
    return order;
  }

  private int placeOf(int input, int from) {
    int place = from;
    while (order[place] != input) {
      place++;
    }
    return place;
  }

  /**
   * Makes L; false if the covariance is not positive semi-definite. The moments' own factor is copied, since they
   * may change before the results are asked for.
   */
  boolean factor(Moments input) {
    if (!input.factor()) {
      failedPivot = input.failedPivot();
      failedValue = input.failedValue();
      return false;
    }
    System.arraycopy(input.lowerFactor().data, 0, factor.data, 0, factor.data.length);
    for (int step = 0; step < schedule.length; step += 4) {
      rotate(schedule[step], schedule[step + 1], schedule[step + 2], schedule[step + 3]);
    }
    return true;
  }

  /**
   * Turns a column and the next so that a row has a zero in the second; where it has zeros in both, they change
   * places. A reflection, so that diagonals stay positive.
   */
  private void rotate(int column, int zeroed, int from, int to) {
    double[] l = factor.data;
    int at = zeroed * order.length + column;
    double first = l[at];
    double second = l[at + 1];
    double square = first * first + second * second;
    double length = square > 0 ? Math.sqrt(square) : Math.hypot(first, second); // tiny ones too
    double cosine = length == 0 ? 0 : first / length;
    double sine = length == 0 ? 1 : second / length;
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

  /** What was wrong when {@link #factor} was last false. */
  String failure() {
    return LowerFactor.describe(failedPivot, order.length, failedValue);
  }

  /** L. */
  DMatrixRMaj factor() {
    return factor;
  }

  /** Whether L is lower triangular as it stands. */
  boolean isNatural() {
    return schedule.length == 0;
  }

  /** k. */
  int count() {
    return count;
  }

  /** The input of an active index. */
  int input(int index) {
    return order[index];
  }
}

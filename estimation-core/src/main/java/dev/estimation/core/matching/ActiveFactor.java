package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.LowerFactor;
import org.ejml.data.DMatrixRMaj;

/**
 * The factor B of the part of an input covariance that a few active inputs carry: P[:, a] = B B[a, :]'
 * (regression of all inputs on the active ones). If the active ones are the first, in natural order, B
 * is a copy of the first columns of the lower factor that the moments have anyway.
 */
final class ActiveFactor {
  private final int[] active;
  private final boolean leading;
  private final LowerFactor ordered;
  private final DMatrixRMaj columns;
  private final DMatrixRMaj rest;
  private int failedPivot;
  private double failedValue;

  ActiveFactor(int[] active, int dimension) {
    this.active = active;
    int[] order = new int[dimension];
    boolean[] taken = new boolean[dimension];
    int next = 0;
    boolean natural = true;
    for (int index : active) {
      natural &= index == next;
      order[next++] = index;
      taken[index] = true;
    }
    this.leading = natural;
    for (int index = 0; index < dimension; index++) {
      if (!taken[index]) {
        order[next++] = index;
      }
    }
    this.ordered = leading ? null : new LowerFactor(order);
    this.columns = new DMatrixRMaj(dimension, active.length);
    this.rest = new DMatrixRMaj(dimension, dimension - active.length);
  }

  /** Makes B and the rest; false if the covariance is not positive semi-definite. */
  boolean factor(Moments input) {
    if (!input.factor()) {
      failedPivot = input.failedPivot();
      failedValue = input.failedValue();
      return false;
    }
    if (leading) {
      split(input.lowerFactor());
      return true;
    }
    if (!ordered.factorSemidefinite(input.covariance())) {
      failedPivot = ordered.failedPivot();
      failedValue = ordered.failedValue();
      return false;
    }
    split(ordered.columns());
    return true;
  }

  private void split(DMatrixRMaj lower) {
    int n = columns.numRows;
    int k = columns.numCols;
    for (int row = 0; row < n; row++) {
      System.arraycopy(lower.data, row * n, columns.data, row * k, k);
      System.arraycopy(lower.data, row * n + k, rest.data, row * (n - k), n - k);
    }
  }

  /** What was wrong when {@link #factor} was last false. */
  String failure() {
    return LowerFactor.describe(failedPivot, columns.numRows, failedValue);
  }

  DMatrixRMaj columns() {
    return columns;
  }

  int count() {
    return active.length;
  }

  DMatrixRMaj rest() {
    return rest;
  }

  /** The input of an active index. */
  int input(int index) {
    return active[index];
  }
}

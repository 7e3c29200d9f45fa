package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.LowerFactor;
import org.ejml.data.DMatrixRMaj;

/**
 * The factor B of the part of an input covariance that a few active inputs carry: P[:, a] = B B[a, :]'
 * (regression of all inputs on the active ones). If all are active in natural order, B is a copy of the
 * lower factor of the moments, which may change before B is used.
 */
final class ActiveFactor {
  private final int[] active;
  private final boolean whole;
  private final LowerFactor ordered;
  private final DMatrixRMaj columns;
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
    this.whole = natural && next == dimension;
    for (int index = 0; index < dimension; index++) {
      if (!taken[index]) {
        order[next++] = index;
      }
    }
    this.ordered = whole ? null : new LowerFactor(order, active.length);
    this.columns = whole ? new DMatrixRMaj(dimension, dimension) : ordered.columns();
  }

  /** Makes B; false if the covariance is not positive semi-definite. */
  boolean factor(Moments input) {
    if (!input.factor()) {
      failedPivot = input.failedPivot();
      failedValue = input.failedValue();
      return false;
    }
    if (whole) {
      columns.setTo(input.lowerFactor());
      return true;
    }
    if (!ordered.factorSemidefinite(input.covariance())) {
      failedPivot = ordered.failedPivot();
      failedValue = ordered.failedValue();
      return false;
    }
    return true;
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

  /** The input of an active index. */
  int input(int index) {
    return active[index];
  }
}

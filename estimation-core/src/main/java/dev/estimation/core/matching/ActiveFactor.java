package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.RowOrder;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * The lower factor of a covariance, the active inputs taken first: L, n x n, with P = L L', its rows in natural
 * order and L[order, :] lower triangular. Its first k columns are B, with B B' the part of P that the active
 * inputs carry; the others are what the remaining inputs have of their own. P[:, active] = B B[active, :]', so a
 * regression on the active inputs needs no division by L.
 */
final class ActiveFactor {
  private final int[] order;
  private final int count;
  private final RowOrder reordering;
  private final DMatrixRMaj factor;
  private int failedPivot;
  private double failedValue;

  ActiveFactor(int[] active, int dimension) {
    this.count = active.length;
    this.order = activeFirst(active, dimension);
    this.reordering = new RowOrder(RowOrder.natural(dimension), order);
    this.factor = new DMatrixRMaj(dimension, dimension);
  }

  private static int[] activeFirst(int[] active, int dimension) {
    int[] order = Arrays.copyOf(active, dimension);
    int next = active.length;
    for (int index = 0; index < dimension; index++) {
      int wanted = index;
      if (Arrays.stream(active).noneMatch(one -> one == wanted)) {
        order[next++] = index;
      }
    }
    return order;
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
    reordering.apply(factor.data);
    return true;
  }

  /** What was wrong when {@link #factor} was last false. */
  String failure() {
    return LowerFactor.describe(failedPivot, order.length, failedValue);
  }

  /** L. */
  DMatrixRMaj factor() {
    return factor;
  }

  /** The inputs, active ones first. */
  int[] order() {
    return order.clone();
  }

  /** k. */
  int count() {
    return count;
  }

  /** The active inputs, in order. */
  int[] inputs() {
    return Arrays.copyOf(order, count);
  }

  /** The input of an active index. */
  int input(int index) {
    return order[index];
  }
}

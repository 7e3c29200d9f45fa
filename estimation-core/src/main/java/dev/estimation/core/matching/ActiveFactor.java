package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Householder;
import dev.estimation.core.internal.LowerFactor;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * The lower Cholesky factor of a covariance, the active inputs taken first: L, n x n, with P = L L' and
 * its rows in natural order. Its first k columns are B, with B B' the part of P that the active inputs carry;
 * the others are what the remaining inputs have of their own. P[:, active] = B B[active, :]', so a regression
 * on the active inputs needs no division by L.
 *
 * <p>Where the active inputs are the first ones in natural order, L is the lower factor that the moments have
 * anyway. It is copied, since the moments may change before the results are asked for.
 */
final class ActiveFactor {
  private final int[] order;
  private final int count;
  private final boolean natural;
  private final LowerFactor ordered;
  private final DMatrixRMaj factor;
  private final double[] triangle;
  private final double[] turned;
  private int failedPivot;
  private double failedValue;

  ActiveFactor(int[] active, int dimension, Form form) {
    this.count = active.length;
    this.order = activeFirst(active, dimension);
    this.natural = isNatural(order);
    this.factor = new DMatrixRMaj(dimension, dimension);
    this.ordered = natural || form == Form.SQUARE_ROOT ? null : new LowerFactor(order);
    int scratch = natural || form == Form.COVARIANCE ? 0 : dimension * dimension;
    this.triangle = new double[scratch];
    this.turned = new double[scratch];
  }

  private static int[] activeFirst(int[] active, int dimension) {
    int[] order = Arrays.copyOf(active, dimension);
    boolean[] taken = new boolean[dimension];
    for (int index : active) {
      taken[index] = true;
    }
    int next = active.length;
    for (int index = 0; index < dimension; index++) {
      if (!taken[index]) {
        order[next++] = index;
      }
    }
    return order;
  }

  private static boolean isNatural(int[] order) {
    for (int i = 0; i < order.length; i++) {
      if (order[i] != i) {
        return false;
      }
    }
    return true;
  }

  /** Makes L; false if the covariance is not positive semi-definite. */
  boolean factor(Moments input) {
    if (ordered != null) {
      return ordered.factorSemidefinite(input.factoredCovariance().lowerTriangle())
          ? take(ordered.columns())
          : fail(ordered.failedPivot(), ordered.failedValue());
    }
    if (!input.factor()) {
      return fail(input.failedPivot(), input.failedValue());
    }
    if (natural) {
      return take(input.lowerFactor());
    }
    turn(input.lowerFactor());
    return true;
  }

  private boolean take(DMatrixRMaj lower) {
    System.arraycopy(lower.data, 0, factor.data, 0, factor.data.length);
    return true;
  }

  private boolean fail(int pivot, double value) {
    failedPivot = pivot;
    failedValue = value;
    return false;
  }

  /** The factor in this order from the one in natural order, by reduction of its rows. */
  private void turn(DMatrixRMaj lower) {
    int n = order.length;
    Arrays.fill(triangle, 0);
    for (int q = 0; q < n; q++) {
      System.arraycopy(lower.data, order[q] * n, turned, q * n, n);
    }
    Householder.reduceLower(triangle, n, turned, n, n);
    for (int q = 0; q < n; q++) {
      System.arraycopy(triangle, q * n, factor.data, order[q] * n, n);
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
    return natural;
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

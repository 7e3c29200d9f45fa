package dev.estimation.core.gaussian;

import dev.estimation.core.internal.Householder;
import java.util.Arrays;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;

/**
 * Axes on which two covariances are diagonal at once: A = T diag(a) T', B = T diag(b) T', a + b = 1. Found from
 * factors, which keep twice the digits of covariances: [L_A L_B] Q = [L 0], then the singular value decomposition of
 * the rows of L^-1 L_A (a below 1/2) and of L^-1 L_B (b below 1/2), each where it is accurate. Axes in which neither has
 * any variance are left out; as many of the smallest a, or b, are zero as the factor lacks columns. Confined to one
 * thread.
 */
final class SharedAxes {
  /** Roots below this fraction of their row are zero: a covariance of doubles cannot hold its square. */
  private static final double NOTHING = 1e-12;

  private final int d;
  private final int[] pivots;
  private final Covariance sum;
  private final DMatrixRMaj turn;
  private final DMatrixRMaj axes;
  private final double[] first;
  private final double[] second;

  /**
   * The axes of two covariances.
   *
   * @param a factored, read
   * @param b factored, read, of the same size
   * @param d rows
   */
  SharedAxes(Covariance a, Covariance b, int d) {
    this.d = d;
    this.sum = new Covariance(d);
    double[] lower = sum.changeFactor().data;
    System.arraycopy(a.lowerFactor().data, 0, lower, 0, d * d);
    Householder.reduceLower(lower, d, b.lowerFactor().data.clone(), d, d);
    this.pivots = pivotsOf(lower);
    int n = pivots.length;
    DMatrixRMaj fromA = whitened(a.lowerFactor());
    DMatrixRMaj fromB = whitened(b.lowerFactor());
    this.turn = leftVectors(fromA);
    DMatrixRMaj turnedA = transposedTimes(turn, fromA);
    int many = 0;
    while (many < n && squaredRow(turnedA, many) > 0.5) {
      many++;
    }
    turnFirst(turn, many, fromB);
    turnedA = transposedTimes(turn, fromA);
    DMatrixRMaj turnedB = transposedTimes(turn, fromB);
    this.first = shares(turnedA, n - rank(a.lowerFactor()));
    this.second = shares(turnedB, n - rank(b.lowerFactor()));
    this.axes = new DMatrixRMaj(d, n);
    CommonOps_DDRM.mult(pivotColumns(), turn, axes);
  }

  /** Columns of a factor that are not zero. */
  private int rank(DMatrixRMaj lower) {
    int rank = 0;
    for (int q = 0; q < d; q++) {
      rank += lower.get(q, q) > 0 ? 1 : 0;
    }
    return rank;
  }

  /** The squares of the rows, of which the smallest are zero. */
  private static double[] shares(DMatrixRMaj turned, int zeros) {
    double[] result = new double[turned.numRows];
    Arrays.setAll(result, row -> squaredRow(turned, row));
    double[] sorted = result.clone();
    Arrays.sort(sorted);
    for (int i = 0; zeros > 0 && i < result.length; i++) {
      result[i] = result[i] <= sorted[zeros - 1] ? 0 : result[i];
    }
    return result;
  }

  /** Where the factor has more than the rounding of its row. */
  private int[] pivotsOf(double[] lower) {
    return IntStream.range(0, d)
        .filter(q -> {
          double scale = 0;
          for (int c = 0; c <= q; c++) {
            scale = Math.hypot(scale, lower[q * d + c]);
          }
          return lower[q * d + q] > NOTHING * scale;
        })
        .toArray();
  }

  private DMatrixRMaj pivotColumns() {
    DMatrixRMaj result = new DMatrixRMaj(d, pivots.length);
    for (int i = 0; i < pivots.length; i++) {
      for (int r = pivots[i]; r < d; r++) {
        result.set(r, i, sum.lowerFactor().get(r, pivots[i]));
      }
    }
    return result;
  }

  /** The solution of L Y = X, of the rows and columns with pivots. */
  private DMatrixRMaj whitened(DMatrixRMaj right) {
    DMatrixRMaj result = new DMatrixRMaj(pivots.length, right.numCols);
    for (int c = 0; c < right.numCols; c++) {
      for (int i = 0; i < pivots.length; i++) {
        double rest = right.get(pivots[i], c);
        for (int j = 0; j < i; j++) {
          rest -= sum.lowerFactor().get(pivots[i], pivots[j]) * result.get(j, c);
        }
        result.set(i, c, rest / sum.lowerFactor().get(pivots[i], pivots[i]));
      }
    }
    return result;
  }

  /** Left singular vectors as columns, those of large values first. */
  private static DMatrixRMaj leftVectors(DMatrixRMaj a) {
    int n = a.numRows;
    DMatrixRMaj square = new DMatrixRMaj(n, n);
    // As many columns as rows, so that the vectors are a whole basis.
    DMatrixRMaj wide = new DMatrixRMaj(n, Math.max(n, a.numCols));
    CommonOps_DDRM.insert(a, wide, 0, 0);
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(n, wide.numCols, true, false, true);
    if (n == 0 || !svd.decompose(wide)) {
      return square;
    }
    DMatrixRMaj u = svd.getU(null, false);
    double[] values = svd.getSingularValues();
    Integer[] order = new Integer[n];
    Arrays.setAll(order, i -> i);
    Arrays.sort(order, (i, j) -> Double.compare(values[j], values[i]));
    for (int i = 0; i < n; i++) {
      for (int r = 0; r < n; r++) {
        square.set(r, i, u.get(r, order[i]));
      }
    }
    return square;
  }

  /** Turns the first columns among themselves until what they see of the other is diagonal too. */
  private static void turnFirst(DMatrixRMaj turn, int many, DMatrixRMaj other) {
    if (many < 2) {
      return;
    }
    DMatrixRMaj some = CommonOps_DDRM.extract(turn, 0, turn.numRows, 0, many);
    DMatrixRMaj better = new DMatrixRMaj(turn.numRows, many);
    CommonOps_DDRM.mult(some, leftVectors(transposedTimes(some, other)), better);
    CommonOps_DDRM.insert(better, turn, 0, 0);
  }

  private static DMatrixRMaj transposedTimes(DMatrixRMaj a, DMatrixRMaj b) {
    DMatrixRMaj result = new DMatrixRMaj(a.numCols, b.numCols);
    CommonOps_DDRM.multTransA(a, b, result);
    return result;
  }

  private static double squaredRow(DMatrixRMaj a, int row) {
    double sum = 0;
    for (int c = 0; c < a.numCols; c++) {
      sum += a.get(row, c) * a.get(row, c);
    }
    return sum;
  }

  /** How many there are. */
  int count() {
    return first.length;
  }

  /** a on an axis. */
  double first(int axis) {
    return first[axis];
  }

  /** b on an axis. */
  double second(int axis) {
    return second[axis];
  }

  /** What of a vector lies along the axes: s with T s the vector, but for what {@link #rest} says. */
  double[] coordinates(double[] vector) {
    DMatrixRMaj result = new DMatrixRMaj(pivots.length, 1);
    CommonOps_DDRM.multTransA(turn, whitened(DMatrixRMaj.wrap(d, 1, vector.clone())), result);
    return result.data;
  }

  /** A vector less T s. */
  double[] rest(double[] vector, double[] s) {
    DMatrixRMaj result = DMatrixRMaj.wrap(d, 1, vector.clone());
    if (s.length > 0) {
      CommonOps_DDRM.multAdd(-1, axes, DMatrixRMaj.wrap(s.length, 1, s), result);
    }
    return result.data;
  }

  /** T, d x count. */
  DMatrixRMaj axes() {
    return axes;
  }
}

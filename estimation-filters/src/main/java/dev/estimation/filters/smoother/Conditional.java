package dev.estimation.filters.smoother;

import dev.estimation.core.internal.Householder;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * The state given the next one: gain G and the lower factor F of the covariance that remains. Orthogonal
 * reduction of a root of the joint covariance of next and this, [N; T] Q = [S 0; Y F], gives S S' = P', G = Y
 * S^-1 and F F' = P - G P' G', with nothing subtracted.
 *
 * <p>A component of the next state that earlier ones determine up to rounding, that of its own row or of its
 * mean, tells nothing further: its column of G is zero, and what it would have told stays in F.
 *
 * @param gain G, d x d
 * @param rest F, d x d, lower triangular
 */
record Conditional(DMatrixRMaj gain, DMatrixRMaj rest) {
  private static final double EPSILON = 0x1p-52;

  /**
   * Reduces a root.
   *
   * @param root 2 d x c, next over this, updated
   * @param magnitudes of the numbers of which the next state's components are differences, d, read
   */
  static Conditional of(DMatrixRMaj root, double[] magnitudes) {
    int d = magnitudes.length;
    int columns = root.numCols;
    DMatrixRMaj s = new DMatrixRMaj(d, d);
    DMatrixRMaj y = new DMatrixRMaj(d, d);
    double[] negligible = new double[d];
    for (int j = 0; j < d; j++) {
      negligible[j] = columns * EPSILON * (length(root.data, j * columns, columns) + magnitudes[j]);
    }
    double[] column = new double[2 * d];
    for (int j = 0; j < d; j++) {
      int rows = 2 * d - j;
      if (length(root.data, 0, columns) > negligible[j]) {
        Arrays.fill(column, 0);
        Householder.reduceLower(column, 1, root.data, rows, columns);
        for (int r = 0; r < rows; r++) {
          (r < d - j ? s : y).set(r < d - j ? j + r : r - (d - j), j, column[r]);
        }
      }
      // The next row comes first.
      System.arraycopy(root.data, columns, root.data, 0, (rows - 1) * columns);
    }
    DMatrixRMaj rest = new DMatrixRMaj(d, d);
    Householder.reduceLower(rest.data, d, root.data, d, columns);
    divide(y, s);
    return new Conditional(y, rest);
  }

  private static double length(double[] data, int start, int count) {
    double sum = 0;
    for (int i = start; i < start + count; i++) {
      sum += data[i] * data[i];
    }
    return Math.sqrt(sum);
  }

  /** Y S^-1, in place, from the last column to the first. */
  private static void divide(DMatrixRMaj y, DMatrixRMaj s) {
    int d = y.numCols;
    for (int j = d - 1; j >= 0; j--) {
      for (int r = 0; r < d; r++) {
        double sum = y.get(r, j);
        for (int c = j + 1; c < d; c++) {
          sum -= y.get(r, c) * s.get(c, j);
        }
        y.set(r, j, s.get(j, j) == 0 ? 0 : sum / s.get(j, j));
      }
    }
  }
}

package dev.estimation.core.internal;

import org.ejml.data.DMatrixRMaj;

/** Kernels and checks on symmetric matrices stored in full, row by row. */
public final class SymmetricMatrix {
  /**
   * How far two mirrored entries may differ, as a fraction of sqrt(p_ii p_jj). Wide enough for the
   * rounding of a product such as F P F', far below any asymmetry that has a cause.
   */
  public static final double SYMMETRY_TOLERANCE = 1e-12;

  private SymmetricMatrix() {}

  /**
   * Copies the lower triangle over the upper one.
   *
   * @param matrix square
   */
  public static void mirrorLower(DMatrixRMaj matrix) {
    double[] data = matrix.data;
    int n = matrix.numRows;
    for (int i = 1; i < n; i++) {
      for (int j = 0; j < i; j++) {
        data[j * n + i] = data[i * n + j];
      }
    }
  }

  /**
   * {@return the row-major indices of the entries on and below the diagonal, row by row}
   *
   * @param n rows
   */
  public static int[] lowerIndices(int n) {
    int[] indices = new int[n * (n + 1) / 2];
    for (int row = 0, at = 0; row < n; row++) {
      for (int column = 0; column <= row; column++) {
        indices[at++] = row * n + column;
      }
    }
    return indices;
  }

  /**
   * {@return whether every entry is finite}
   *
   * @param matrix checked
   */
  public static boolean allFinite(DMatrixRMaj matrix) {
    return Checks.allFinite(matrix.data, matrix.numRows * matrix.numCols);
  }

  /**
   * {@return the row-major index of the first entry that is not finite, or -1}
   *
   * @param matrix square
   */
  public static int firstNotFinite(DMatrixRMaj matrix) {
    int size = matrix.numRows * matrix.numCols;
    for (int i = 0; i < size; i++) {
      if (!Double.isFinite(matrix.data[i])) {
        return i;
      }
    }
    return -1;
  }

  /**
   * {@return the row-major index of the first lower entry that differs from its mirror, or -1}
   *
   * @param matrix square
   */
  public static int firstAsymmetric(DMatrixRMaj matrix) {
    double[] data = matrix.data;
    int n = matrix.numRows;
    for (int i = 1; i < n; i++) {
      for (int j = 0; j < i; j++) {
        double difference = Math.abs(data[i * n + j] - data[j * n + i]);
        if (difference == 0) {
          continue;
        }
        // Two roots, since the product of the variances may overflow or vanish.
        double scale = Math.sqrt(data[i * n + i]) * Math.sqrt(data[j * n + j]);
        if (!(difference <= SYMMETRY_TOLERANCE * scale)) {
          return i * n + j;
        }
      }
    }
    return -1;
  }
}

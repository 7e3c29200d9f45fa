package dev.estimation.core.gaussian;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.SymmetricMatrix;
import org.ejml.data.DMatrixRMaj;

/** Covariances as they are given: copied, of the right shape, symmetric and positive semi-definite. */
final class CovarianceInput {
  private CovarianceInput() {}

  /** A copy of rows; {@code match} is what they must match, for the message. */
  static DMatrixRMaj of(int n, double[][] rows, Object match) {
    DMatrixRMaj matrix = new DMatrixRMaj(n, n);
    if (rows.length != n) {
      throw wrongShape(n, match, rows.length + " rows");
    }
    for (int i = 0; i < n; i++) {
      if (rows[i].length != n) {
        throw wrongShape(n, match, "row " + i + " of length " + rows[i].length);
      }
      System.arraycopy(rows[i], 0, matrix.data, i * n, n);
    }
    return checked(matrix);
  }

  static DMatrixRMaj of(int n, DMatrixRMaj covariance, Object match) {
    if (covariance.numRows != n || covariance.numCols != n) {
      throw wrongShape(n, match, covariance.numRows + " x " + covariance.numCols);
    }
    return checked(covariance.copy());
  }

  static DMatrixRMaj diagonal(int n, double[] standardDeviations) {
    Checks.length("standardDeviations", standardDeviations, n);
    DMatrixRMaj matrix = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      if (!(standardDeviations[i] >= 0)) {
        throw new IllegalArgumentException(
            "standardDeviations[" + i + "] must be 0 or more, got " + standardDeviations[i]);
      }
      matrix.data[i * n + i] = standardDeviations[i] * standardDeviations[i];
    }
    return checked(matrix);
  }

  private static IllegalArgumentException wrongShape(int n, Object match, String got) {
    return new IllegalArgumentException(
        "covariance must be " + n + " x " + n + " to match " + match + ", got " + got);
  }

  private static DMatrixRMaj checked(DMatrixRMaj covariance) {
    int n = covariance.numRows;
    int bad = SymmetricMatrix.firstNotFinite(covariance);
    if (bad >= 0) {
      throw new IllegalArgumentException(
          "covariance" + place(bad, n) + " must be finite, got " + covariance.data[bad]);
    }
    int odd = SymmetricMatrix.firstAsymmetric(covariance);
    if (odd >= 0) {
      int mirror = odd % n * n + odd / n;
      throw new IllegalArgumentException(
          "covariance must be symmetric, got " + place(odd, n) + " = " + covariance.data[odd]
              + " and " + place(mirror, n) + " = " + covariance.data[mirror]);
    }
    SymmetricMatrix.mirrorLower(covariance);
    LowerFactor factor = new LowerFactor(n);
    if (!factor.factorSemidefinite(covariance)) {
      throw new IllegalArgumentException("covariance is not positive semi-definite: "
          + factor.failure() + ", largest diagonal " + largestDiagonal(covariance));
    }
    return covariance;
  }

  private static String place(int index, int n) {
    return "[" + index / n + "][" + index % n + "]";
  }

  private static double largestDiagonal(DMatrixRMaj matrix) {
    double largest = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < matrix.numRows; i++) {
      largest = Math.max(largest, matrix.get(i, i));
    }
    return largest;
  }
}

package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.internal.SymmetricMatrix;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/** A noise covariance that a model fills, and the check that it is one. */
final class NoiseMatrix {
  private final String name;
  private final DMatrixRMaj matrix;
  private final boolean definite;
  private final Covariance accepted;
  private boolean anyAccepted;

  /**
   * Room for a noise covariance.
   *
   * @param definite whether zero variances are refused
   */
  NoiseMatrix(String name, int dimension, boolean definite) {
    this.name = name;
    this.matrix = new DMatrixRMaj(dimension, dimension);
    this.definite = definite;
    this.accepted = new Covariance(dimension);
  }

  /** The array for the model to fill, all zeros. */
  double[] blank() {
    Arrays.fill(matrix.data, 0);
    return matrix.data;
  }

  /** Checks what was filled; a matrix equal to the last one accepted needs no second check. */
  boolean isValid() {
    if (anyAccepted && Arrays.equals(matrix.data, accepted.matrix().data)) {
      return true;
    }
    anyAccepted = isCovariance();
    return anyAccepted;
  }

  private boolean isCovariance() {
    if (SymmetricMatrix.firstNotFinite(matrix) >= 0
        || firstBadVariance() >= 0
        || SymmetricMatrix.firstAsymmetric(matrix) >= 0) {
      return false;
    }
    accepted.changeMatrix().setTo(matrix);
    return definite ? accepted.isDefinite() : accepted.factor();
  }

  private int firstBadVariance() {
    int n = matrix.numRows;
    for (int i = 0; i < n; i++) {
      double variance = matrix.data[i * (n + 1)];
      if (!(definite ? variance > 0 : variance >= 0)) {
        return i * (n + 1);
      }
    }
    return -1;
  }

  /** Overwrites v with L^-1 v, L the lower factor, after {@link #isValid()} was true. */
  void whiten(double[] v) {
    accepted.solveLower(v);
  }

  /** A copy of what was accepted: the model may still hold the array that it filled. */
  Covariance covariance() {
    return accepted;
  }

  /** What was wrong when {@link #isValid()} was false. */
  String failure() {
    int n = matrix.numRows;
    int bad = SymmetricMatrix.firstNotFinite(matrix);
    int badVariance = firstBadVariance();
    int wrong = bad >= 0 ? bad : badVariance;
    if (wrong >= 0) {
      String wanted =
          wrong % (n + 1) == 0 ? (definite ? "finite and > 0" : "finite and >= 0") : "finite";
      return place(wrong) + " must be " + wanted + ", got " + matrix.data[wrong];
    }
    int odd = SymmetricMatrix.firstAsymmetric(matrix);
    if (odd >= 0) {
      int mirror = odd % n * n + odd / n;
      return name + " must be symmetric, got " + place(odd) + " = " + matrix.data[odd] + " and "
          + place(mirror) + " = " + matrix.data[mirror];
    }
    return name + " is not positive " + (definite ? "definite: " : "semi-definite: ")
        + accepted.failure();
  }

  private String place(int index) {
    int n = matrix.numRows;
    return name + "[" + index / n + "][" + index % n + "]";
  }
}

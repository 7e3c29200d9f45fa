package dev.estimation.core.internal;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/**
 * Lengths in standard deviations of a covariance S; its root S^1/2 is the lower Cholesky factor. For analysis off
 * the step path: allocates.
 */
public final class Whitening {
  private final LowerFactor scale;
  private final boolean definite;

  /**
   * Whitening by a covariance.
   *
   * @param covariance S, m x m, read
   */
  public Whitening(DMatrixRMaj covariance) {
    this.scale = new LowerFactor(covariance.numRows);
    this.definite = scale.factorDefinite(covariance);
  }

  /** {@return whether S is positive definite; only then does the rest mean anything} */
  public boolean isDefinite() {
    return definite;
  }

  /** {@return which pivot of S is not positive, and its value} */
  public String failure() {
    return scale.failure();
  }

  /**
   * Overwrites v with S^-1/2 v.
   *
   * @param v m numbers, updated
   */
  public void solve(double[] v) {
    scale.solveLower(v);
  }

  /**
   * {@return |S^-1/2 v|}
   *
   * @param v m numbers, read
   */
  public double length(double[] v) {
    double[] unit = v.clone();
    solve(unit);
    double squares = 0;
    for (double value : unit) {
      squares += value * value;
    }
    return Math.sqrt(squares);
  }

  /**
   * {@return W S^-T/2: S^-1/2 of each row}
   *
   * @param w k x m, read
   */
  public DMatrixRMaj rows(DMatrixRMaj w) {
    DMatrixRMaj result = w.copy();
    double[] row = new double[w.numCols];
    for (int r = 0; r < w.numRows; r++) {
      System.arraycopy(w.data, r * row.length, row, 0, row.length);
      scale.solveLower(row);
      System.arraycopy(row, 0, result.data, r * row.length, row.length);
    }
    return result;
  }

  /**
   * {@return the eigenvalues of S^-1/2 D S^-T/2}
   *
   * @param d D, m x m, symmetric, read
   */
  public double[] eigenvalues(DMatrixRMaj d) {
    DMatrixRMaj half = rows(d);
    CommonOps_DDRM.transpose(half);
    return symmetricEigenvalues(rows(half));
  }

  /**
   * {@return the largest singular value of W S^-T/2}
   *
   * @param w k x m, read
   */
  public double norm(DMatrixRMaj w) {
    DMatrixRMaj unit = rows(w);
    DMatrixRMaj square = new DMatrixRMaj(w.numCols, w.numCols);
    CommonOps_DDRM.multInner(unit, square);
    return Math.sqrt(largest(symmetricEigenvalues(square)));
  }

  /**
   * {@return the largest absolute value; NaN if there is one}
   *
   * @param values read
   */
  public static double largest(double[] values) {
    double result = 0;
    for (double value : values) {
      result = Math.max(result, Math.abs(value));
    }
    return result;
  }

  private static double[] symmetricEigenvalues(DMatrixRMaj matrix) {
    EigenDecomposition_F64<DMatrixRMaj> eigen =
        DecompositionFactory_DDRM.eig(matrix.numRows, false, true);
    double[] values = new double[matrix.numRows];
    boolean found = eigen.decompose(matrix);
    for (int i = 0; i < values.length; i++) {
      values[i] = found ? eigen.getEigenvalue(i).getReal() : Double.NaN;
    }
    return values;
  }
}

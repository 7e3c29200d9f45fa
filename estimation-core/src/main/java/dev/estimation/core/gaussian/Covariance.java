package dev.estimation.core.gaussian;

import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * A mutable covariance P of fixed size with its lower factor L, P = L L', for the step path. Either is
 * filled; the other is made when it is asked for, and kept.
 *
 * <p><i>Confined to one thread.</i> Allocates only when built. Cost of a factor, or of a matrix from it: d^3 /
 * 6 multiplications, of a factor d square roots too.
 */
public final class Covariance {
  private final DMatrixRMaj matrix;
  private final LowerFactor factor;
  private final double[] ones;
  private boolean matrixKnown = true;
  private boolean mirrored = true;
  private boolean factorKnown;

  /**
   * A covariance of zeros.
   *
   * @param dimension rows and columns
   */
  public Covariance(int dimension) {
    this.matrix = new DMatrixRMaj(dimension, dimension);
    this.factor = new LowerFactor(dimension);
    this.ones = new double[dimension];
    Arrays.fill(ones, 1);
  }

  /** {@return rows and columns} */
  public int dimension() {
    return ones.length;
  }

  /** {@return P: the matrix itself, to be read only, valid until the next change} */
  public DMatrixRMaj matrix() {
    lowerTriangle();
    if (!mirrored) {
      SymmetricMatrix.mirrorLower(matrix);
      mirrored = true;
    }
    return matrix;
  }

  /** {@return P, of which only the entries on and below the diagonal are valid; as {@link #matrix()}} */
  public DMatrixRMaj lowerTriangle() {
    if (!matrixKnown) {
      int d = ones.length;
      Products.fillOuterProduct(factor.columns().data, ones, d, d, matrix.data);
      matrixKnown = true;
      mirrored = false;
    }
    return matrix;
  }

  /** {@return P, to be filled entirely and symmetrically; forgets the factor} */
  public DMatrixRMaj changeMatrix() {
    mirrored = true;
    matrixKnown = true;
    factorKnown = false;
    return matrix;
  }

  /** {@return P, to be filled on and below the diagonal; forgets the factor} */
  public DMatrixRMaj changeLowerTriangle() {
    changeMatrix();
    mirrored = false;
    return matrix;
  }

  /** {@return L, to be filled entirely, zeros above the diagonal and none below 0 on it; forgets P} */
  public DMatrixRMaj changeFactor() {
    matrixKnown = false;
    factorKnown = false;
    return factor.columns();
  }

  /**
   * Makes sure that the lower factor exists.
   *
   * @return false if the covariance is not finite or not positive semi-definite; {@link #failure()} then
   *     says where
   */
  public boolean factor() {
    if (!factorKnown) {
      factorKnown = matrixKnown ? factor.factorSemidefinite(matrix) : factor.accept();
    }
    return factorKnown;
  }

  /** {@return whether {@link #factor()} is true and no pivot is zero up to rounding} */
  public boolean isDefinite() {
    return factor() && factor.isDefinite();
  }

  /** {@return L; read only, valid after {@link #factor()} was true} */
  public DMatrixRMaj lowerFactor() {
    return factor.columns();
  }

  /**
   * Overwrites a vector with L^-1 v, for a definite covariance.
   *
   * @param v d numbers, updated
   */
  public void solveLower(double[] v) {
    factor.solveLower(v);
  }

  /** {@return ln det P, for a definite covariance} */
  public double logDeterminant() {
    return factor.logDeterminant();
  }

  /**
   * Takes the values of another of the same size.
   *
   * @param other copied from
   */
  public void set(Covariance other) {
    matrixKnown = other.matrixKnown;
    mirrored = other.mirrored;
    factorKnown = other.factorKnown;
    if (matrixKnown) {
      System.arraycopy(other.matrix.data, 0, matrix.data, 0, matrix.getNumElements());
    }
    if (factorKnown || !matrixKnown) {
      factor.set(other.factor);
    }
  }

  /** {@return the pivot that made the last {@link #factor()} fail, from 0; -1 if none did} */
  public int failedPivot() {
    return factor.failedPivot();
  }

  /** {@return the value of that pivot} */
  public double failedValue() {
    return factor.failedValue();
  }

  /** {@return which pivot made the last {@link #factor()} or {@link #isDefinite()} false, and its value} */
  public String failure() {
    return factor.failure();
  }
}

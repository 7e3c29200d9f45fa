package dev.estimation.core.gaussian;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.SymmetricMatrix;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * A mean and a covariance: what is known of a vector.
 *
 * <p>The covariance is finite, symmetric and positive semi-definite; a variance may be zero. Mirrored
 * entries may differ by 1e-12 sqrt(p_ii p_jj), the rounding of a matrix product; the lower triangle
 * is the one used. Positive semi-definite means that every Cholesky pivot is positive, or within its
 * rounding of zero with an equally small column.
 *
 * <p><i>Immutable.</i> Factories copy what they are given, accessors return numbers or copies.
 */
public final class Gaussian {
  private final double[] mean;
  private final DMatrixRMaj covariance;

  private Gaussian(double[] mean, DMatrixRMaj covariance) {
    this.mean = mean;
    this.covariance = covariance;
  }

  /**
   * A mean and covariance.
   *
   * @param mean n numbers, copied
   * @param covariance n rows of n numbers, copied
   * @return the value
   * @throws IllegalArgumentException if shapes differ, a number is not finite, or the covariance is
   *     not symmetric or not positive semi-definite
   */
  public static Gaussian of(double[] mean, double[][] covariance) {
    int n = mean.length;
    DMatrixRMaj matrix = new DMatrixRMaj(n, n);
    if (covariance.length != n) {
      throw wrongShape(n, covariance.length + " rows");
    }
    for (int i = 0; i < n; i++) {
      if (covariance[i].length != n) {
        throw wrongShape(n, "row " + i + " of length " + covariance[i].length);
      }
      System.arraycopy(covariance[i], 0, matrix.data, i * n, n);
    }
    return checked(mean.clone(), matrix);
  }

  /**
   * A mean and covariance.
   *
   * @param mean n numbers, copied
   * @param covariance n x n, copied
   * @return the value
   * @throws IllegalArgumentException as for {@link #of(double[], double[][])}
   */
  public static Gaussian of(double[] mean, DMatrixRMaj covariance) {
    int n = mean.length;
    if (covariance.numRows != n || covariance.numCols != n) {
      throw wrongShape(n, covariance.numRows + " x " + covariance.numCols);
    }
    return checked(mean.clone(), covariance.copy());
  }

  /**
   * Independent components.
   *
   * @param mean n numbers, copied
   * @param standardDeviations n numbers, each 0 or more, in the units of the mean
   * @return the value
   */
  public static Gaussian independent(double[] mean, double[] standardDeviations) {
    int n = mean.length;
    Checks.length("standardDeviations", standardDeviations, n);
    DMatrixRMaj matrix = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      if (!(standardDeviations[i] >= 0)) {
        throw new IllegalArgumentException(
            "standardDeviations[" + i + "] must be 0 or more, got " + standardDeviations[i]);
      }
      matrix.data[i * n + i] = standardDeviations[i] * standardDeviations[i];
    }
    return checked(mean.clone(), matrix);
  }

  private static IllegalArgumentException wrongShape(int n, String got) {
    return new IllegalArgumentException(
        "covariance must be " + n + " x " + n + " to match the mean, got " + got);
  }

  private static Gaussian checked(double[] mean, DMatrixRMaj covariance) {
    int n = mean.length;
    if (n == 0) {
      throw new IllegalArgumentException("mean must have at least 1 component, got 0");
    }
    Checks.finite("mean", mean);
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
    return new Gaussian(mean, covariance);
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

  /** {@return the number of components} */
  public int dimension() {
    return mean.length;
  }

  /**
   * {@return the mean of one component}
   *
   * @param index from 0
   */
  public double mean(int index) {
    return mean[index];
  }

  /**
   * {@return the covariance of two components}
   *
   * @param row from 0
   * @param column from 0
   */
  public double covariance(int row, int column) {
    return covariance.get(row, column);
  }

  /**
   * {@return the standard deviation of one component}
   *
   * @param index from 0
   */
  public double standardDeviation(int index) {
    return Math.sqrt(covariance.get(index, index));
  }

  /** {@return a copy of the mean} */
  public double[] mean() {
    return mean.clone();
  }

  /** {@return a copy of the covariance, n x n} */
  public DMatrixRMaj covariance() {
    return covariance.copy();
  }

  void copyInto(double[] meanTarget, DMatrixRMaj covarianceTarget) {
    System.arraycopy(mean, 0, meanTarget, 0, mean.length);
    System.arraycopy(covariance.data, 0, covarianceTarget.data, 0, mean.length * mean.length);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Gaussian that
        && Arrays.equals(mean, that.mean)
        && Arrays.equals(covariance.data, that.covariance.data);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(mean) + Arrays.hashCode(covariance.data);
  }

  @Override
  public String toString() {
    int n = mean.length;
    double[] deviations = new double[n];
    Arrays.setAll(deviations, this::standardDeviation);
    return "Gaussian[mean " + Arrays.toString(mean) + ", standard deviations "
        + Arrays.toString(deviations) + "]";
  }
}

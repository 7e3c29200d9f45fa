package dev.estimation.core.gaussian;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * A mean and a covariance: what is known of a vector.
 *
 * <p>The {@link #dimension()} is the size of the covariance. The mean has as many numbers, unless it is a
 * point of a {@link Space} that needs more: a unit quaternion has a mean of 4 numbers and a covariance of 3
 * x 3, that of the difference from the mean. Such a mean is given with its space. Two values are equal
 * if all their numbers are.
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
    return new Gaussian(point(mean), CovarianceInput.of(mean.length, covariance, "the mean"));
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
    return new Gaussian(point(mean), CovarianceInput.of(mean.length, covariance, "the mean"));
  }

  /**
   * Independent components.
   *
   * @param mean n numbers, copied
   * @param standardDeviations n numbers, each 0 or more, in the units of the mean
   * @return the value
   */
  public static Gaussian independent(double[] mean, double[] standardDeviations) {
    return new Gaussian(point(mean), CovarianceInput.diagonal(mean.length, standardDeviations));
  }

  /**
   * A mean and covariance in a space.
   *
   * @param space where the vector lives, of dimension d
   * @param mean a point of the space, copied; then displaced by zero, which brings angles into their
   *     range and gives a quaternion the length 1
   * @param covariance d rows of d numbers, copied
   * @return the value
   * @throws IllegalArgumentException as for {@link #of(double[], double[][])}, or if the space does not
   *     contain the mean
   */
  public static Gaussian of(Space space, double[] mean, double[][] covariance) {
    return new Gaussian(
        point(space, mean), CovarianceInput.of(space.dimension(), covariance, space));
  }

  /**
   * A mean and covariance in a space.
   *
   * @param space where the vector lives, of dimension d
   * @param mean as for {@link #of(Space, double[], double[][])}
   * @param covariance d x d, copied
   * @return the value
   * @throws IllegalArgumentException as for {@link #of(Space, double[], double[][])}
   */
  public static Gaussian of(Space space, double[] mean, DMatrixRMaj covariance) {
    return new Gaussian(
        point(space, mean), CovarianceInput.of(space.dimension(), covariance, space));
  }

  /**
   * Independent components in a space.
   *
   * @param space where the vector lives, of dimension d
   * @param mean as for {@link #of(Space, double[], double[][])}
   * @param standardDeviations d numbers, each 0 or more, in the units of differences
   * @return the value
   */
  public static Gaussian independent(Space space, double[] mean, double[] standardDeviations) {
    return new Gaussian(
        point(space, mean), CovarianceInput.diagonal(space.dimension(), standardDeviations));
  }

  private static double[] point(double[] mean) {
    if (mean.length == 0) {
      throw new IllegalArgumentException("mean must have at least 1 component, got 0");
    }
    Checks.finite("mean", mean);
    return mean.clone();
  }

  private static double[] point(Space space, double[] mean) {
    if (mean.length != space.storage()) {
      throw new IllegalArgumentException("mean must have length " + space.storage()
          + " to be a point of " + space + ", got " + mean.length);
    }
    Checks.finite("mean", mean);
    if (!space.contains(mean)) {
      throw new IllegalArgumentException(
          "mean must be a point of " + space + ", got " + Arrays.toString(mean));
    }
    double[] point = new double[mean.length];
    space.displace(mean, new double[space.dimension()], point);
    return point;
  }

  /** {@return the size of the covariance} */
  public int dimension() {
    return covariance.numRows;
  }

  /**
   * {@return one number of the mean}
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
   * {@return the standard deviation of one component of differences from the mean}
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
    int size = covariance.getNumElements();
    System.arraycopy(covariance.data, 0, covarianceTarget.data, 0, size);
  }

  boolean isIn(Space space) {
    return dimension() == space.dimension() && space.contains(mean);
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
    double[] deviations = new double[dimension()];
    Arrays.setAll(deviations, this::standardDeviation);
    return "Gaussian[mean " + Arrays.toString(mean) + ", standard deviations "
        + Arrays.toString(deviations) + "]";
  }
}

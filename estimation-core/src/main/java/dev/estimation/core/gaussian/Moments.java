package dev.estimation.core.gaussian;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * A mutable mean and covariance of fixed size, for the step path.
 *
 * <p>Shapes: mean of {@code space.storage()} numbers, covariance d x d with d = {@code
 * space.dimension()}. Covariance or lower factor is filled; the other is made when it is asked for, and kept.
 *
 * <p><i>Confined to one thread.</i> Allocates only when built. Cost: see {@link Covariance}.
 */
public final class Moments {
  private final Space space;
  private final double[] mean;
  private final Covariance covariance;

  /**
   * Moments in the given space, all zero.
   *
   * @param space where the vector lives
   */
  public Moments(Space space) {
    this.space = space;
    this.mean = new double[space.storage()];
    this.covariance = new Covariance(space.dimension());
  }

  /** {@return where the vector lives} */
  public Space space() {
    return space;
  }

  /** {@return the mean: the array itself, to be read only, valid until the next change} */
  public double[] mean() {
    return mean;
  }

  /** {@return the covariance: the matrix itself, to be read only, valid until the next change} */
  public DMatrixRMaj covariance() {
    return covariance.matrix();
  }

  /** {@return the mean, to be filled} */
  public double[] changeMean() {
    return mean;
  }

  /** {@return the covariance, to be filled entirely and symmetrically; forgets the factor} */
  public DMatrixRMaj changeCovariance() {
    return covariance.changeMatrix();
  }

  /** {@return the covariance with its factor: the object itself, to be changed by filling either} */
  public Covariance factoredCovariance() {
    return covariance;
  }

  /** {@return the lower factor, to be filled as {@link Covariance#changeFactor()} says} */
  public DMatrixRMaj changeFactor() {
    return covariance.changeFactor();
  }

  /**
   * Takes the values of a Gaussian of the same size.
   *
   * @param value copied from
   * @throws IllegalArgumentException if its dimension is not that of the space, or its mean no point there
   */
  public void set(Gaussian value) {
    if (value.dimension() != space.dimension()) {
      throw new IllegalArgumentException("a Gaussian must have dimension " + space.dimension()
          + " to be set here, got " + value.dimension());
    }
    if (!value.isIn(space)) {
      throw new IllegalArgumentException("a Gaussian must have a mean in " + space
          + " to be set here, got " + Arrays.toString(value.mean()));
    }
    value.copyInto(mean, changeCovariance());
  }

  /**
   * Takes the values of moments of the same size.
   *
   * @param other copied from
   */
  public void set(Moments other) {
    Checks.length("mean", other.mean, mean.length);
    if (other.covariance.dimension() != covariance.dimension()) {
      throw new IllegalArgumentException("moments must have dimension " + covariance.dimension()
          + " to be set here, got " + other.covariance.dimension());
    }
    System.arraycopy(other.mean, 0, mean, 0, mean.length);
    covariance.set(other.covariance);
  }

  /**
   * Makes sure that the lower factor exists.
   *
   * @return false if the covariance is not finite or not positive semi-definite; {@link
   *     #factorFailure()} then says where
   */
  public boolean factor() {
    return covariance.factor();
  }

  /** {@return the lower factor L, with covariance = L L'; read only, valid after {@link #factor()} was true} */
  public DMatrixRMaj lowerFactor() {
    return covariance.lowerFactor();
  }

  /** {@return the pivot that made the last {@link #factor()} fail, from 0; -1 if none did} */
  public int failedPivot() {
    return covariance.failedPivot();
  }

  /** {@return the value of that pivot} */
  public double failedValue() {
    return covariance.failedValue();
  }

  /** {@return which pivot made the last {@link #factor()} fail, and its value} */
  public String factorFailure() {
    return covariance.failure();
  }

  /**
   * These moments as an immutable value. The square of a lower factor whose deviations differ by 1e7 and more may round
   * to a matrix that is not positive semi-definite; its variances are then raised by as few roundings as it takes.
   *
   * @return the value
   * @throws IllegalArgumentException if they are not those of a Gaussian
   */
  public Gaussian toGaussian() {
    return factor()
        ? RoundedGaussian.of(space, mean, covariance())
        : Gaussian.of(space, mean, covariance());
  }
}

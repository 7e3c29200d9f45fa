package dev.estimation.core.accuracy;

import dev.estimation.core.gaussian.Gaussian;
import org.ejml.data.DMatrixRMaj;

/**
 * Where a function is looked at: what is known of its input, what else it is given, and the noise added to its
 * output. One step of a log gives one such point. <i>Immutable.</i>
 */
public final class OperatingPoint {
  private final Gaussian input;
  private final DMatrixRMaj noise;
  private final double[] given;

  private OperatingPoint(Gaussian input, DMatrixRMaj noise, double[] given) {
    this.input = input;
    this.noise = noise;
    this.given = given;
  }

  /**
   * A point with noise.
   *
   * @param input mean and covariance of the input
   * @param noise Q or R, m x m, copied
   * @param given handed to the function, copied; may be empty
   * @return the point
   */
  public static OperatingPoint of(Gaussian input, double[][] noise, double... given) {
    return of(input, new DMatrixRMaj(noise), given);
  }

  /**
   * A point with noise.
   *
   * @param input mean and covariance of the input
   * @param noise Q or R, m x m, copied
   * @param given handed to the function, copied; may be empty
   * @return the point
   */
  public static OperatingPoint of(Gaussian input, DMatrixRMaj noise, double... given) {
    if (noise.numRows != noise.numCols) {
      throw new IllegalArgumentException(
          "noise must be square, got " + noise.numRows + " x " + noise.numCols);
    }
    // Checks that it is a covariance.
    DMatrixRMaj checked = Gaussian.of(new double[noise.numRows], noise).covariance();
    return new OperatingPoint(input, checked, given.clone());
  }

  /** {@return what is known of the input} */
  public Gaussian input() {
    return input;
  }

  /** {@return Q or R, a copy} */
  public DMatrixRMaj noise() {
    return noise.copy();
  }

  /** {@return what the function is given, a copy} */
  public double[] given() {
    return given.clone();
  }
}

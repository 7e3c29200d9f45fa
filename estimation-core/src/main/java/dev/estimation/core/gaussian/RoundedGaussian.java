package dev.estimation.core.gaussian;

import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;

/**
 * A Gaussian from a covariance that is positive semi-definite but for its rounding: where deviations of different
 * directions differ by 1e7 and more, a product of roots may round to a matrix that is not. Its variances are
 * then raised by as few roundings as it takes.
 */
final class RoundedGaussian {
  private static final double EPSILON = 0x1p-52;

  /** Beyond this it is no rounding. */
  private static final double MOST = 1e-11;

  private RoundedGaussian() {}

  /** Both are read; the covariance is symmetric. */
  static Gaussian of(Space space, double[] mean, DMatrixRMaj covariance) {
    int d = covariance.numRows;
    Covariance tried = new Covariance(d);
    double raise = 0;
    tried.changeMatrix().setTo(covariance);
    while (!tried.factor() && raise < MOST) {
      raise = Math.max(d * EPSILON, 2 * raise);
      DMatrixRMaj matrix = tried.changeMatrix();
      for (int i = 0; i < d; i++) {
        matrix.set(i, i, covariance.get(i, i) * (1 + raise));
      }
    }
    return Gaussian.of(space, mean, tried.matrix());
  }
}

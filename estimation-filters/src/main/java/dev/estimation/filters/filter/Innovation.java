package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;

/** An innovation, its covariance factored, and how likely it was. Confined to one thread. */
final class Innovation {
  private static final double LOG_TWO_PI = Math.log(2 * Math.PI);

  private final Space space;
  private final LowerFactor factor;
  private final double[] value;
  private final double[] whitened;
  private double squared = Double.NaN;
  private double logLikelihood = Double.NaN;

  Innovation(Space space) {
    this.space = space;
    this.factor = new LowerFactor(space.dimension());
    this.value = new double[space.dimension()];
    this.whitened = new double[space.dimension()];
  }

  void clear() {
    squared = Double.NaN;
    logLikelihood = Double.NaN;
  }

  /** Factors the covariance S = L L' of a predicted measurement; false if it is not definite. */
  boolean factor(DMatrixRMaj covariance) {
    return factor.factorDefinite(covariance);
  }

  /** Finds nu = z - mean, L^-1 nu, the normalised square and the log-likelihood. */
  void weigh(Moments predicted, double[] measurement) {
    space.difference(measurement, predicted.mean(), value);
    int m = value.length;
    System.arraycopy(value, 0, whitened, 0, m);
    factor.solveLower(whitened);
    double sum = 0;
    for (int i = 0; i < m; i++) {
      sum += whitened[i] * whitened[i];
    }
    squared = sum;
    logLikelihood = -0.5 * (sum + factor.logDeterminant() + m * LOG_TWO_PI);
  }

  /** Overwrites v with L^-1 v. */
  void whiten(double[] v) {
    factor.solveLower(v);
  }

  double[] value() {
    return value;
  }

  /** L^-1 nu. */
  double[] whitened() {
    return whitened;
  }

  double squared() {
    return squared;
  }

  double logLikelihood() {
    return logLikelihood;
  }

  String failure() {
    return "covariance of the innovation is not positive definite: " + factor.failure();
  }
}

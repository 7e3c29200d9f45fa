package dev.estimation.filters.smoother;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** One step of the smoother backwards, in place. Owns its scratch; confined to one thread. */
final class BackwardStep {
  private final Space space;
  private final int d;
  private final LowerFactor factor;
  private final DMatrixRMaj gain;
  private final DMatrixRMaj change;
  private final DMatrixRMaj product;
  private final double[] difference;
  private final double[] correction;

  BackwardStep(Space space) {
    this.space = space;
    this.d = space.dimension();
    this.factor = new LowerFactor(d);
    this.gain = new DMatrixRMaj(d, d);
    this.change = new DMatrixRMaj(d, d);
    this.product = new DMatrixRMaj(d, d);
    this.difference = new double[d];
    this.correction = new double[d];
  }

  /** Smooths step k of the track, given that step k + 1 is smoothed. */
  void smooth(SmoothedTrack track, int k, RecordedStep next) {
    fillGain(next);
    double[] mean = track.meanArray(k);
    space.difference(track.meanArray(k + 1), next.predicted().mean(), difference);
    for (int r = 0; r < d; r++) {
      double sum = 0;
      for (int c = 0; c < d; c++) {
        sum += gain.data[r * d + c] * difference[c];
      }
      correction[r] = sum;
    }
    space.displace(mean, correction, mean);
    addCovariance(track.covarianceMatrix(k), track.covarianceMatrix(k + 1), next);
    if (!Checks.allFinite(mean) || SymmetricMatrix.firstNotFinite(track.covarianceMatrix(k)) >= 0) {
      throw new ArithmeticException(
          "smoothed estimate is not finite at t = " + track.time(k) + " s");
    }
  }

  /** G = C P'^-1, row by row, by solving against the factor of P'. */
  private void fillGain(RecordedStep next) {
    if (!factor.factorSemidefinite(next.predicted().covariance())) {
      throw new ArithmeticException("predicted covariance is not positive semi-definite: "
          + factor.failure() + " (at t = " + next.time() + " s)");
    }
    gain.setTo(next.cross());
    for (int row = 0; row < d; row++) {
      factor.solve(gain.data, row * d);
    }
  }

  /** P += G (P_s+ - P') G', symmetric by construction. */
  private void addCovariance(DMatrixRMaj covariance, DMatrixRMaj smoothedNext, RecordedStep next) {
    CommonOps_DDRM.subtract(smoothedNext, next.predicted().covariance(), change);
    CommonOps_DDRM.mult(gain, change, product);
    for (int r = 0; r < d; r++) {
      for (int c = 0; c <= r; c++) {
        double sum = 0;
        for (int i = 0; i < d; i++) {
          sum += product.data[r * d + i] * gain.data[c * d + i];
        }
        covariance.data[r * d + c] += sum;
      }
    }
    SymmetricMatrix.mirrorLower(covariance);
  }
}

package dev.estimation.filters.smoother;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Householder;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** Steps of the smoother backwards, from the last filtered estimate. Owns its scratch; confined to one thread. */
final class BackwardStep {
  private final Space space;
  private final int d;
  private final Moments smoothed;
  private final LowerFactor factor;
  private final DMatrixRMaj gain;
  private final DMatrixRMaj change;
  private final DMatrixRMaj product;
  private final DMatrixRMaj difference;
  private final DMatrixRMaj correction;

  BackwardStep(Moments last) {
    this.space = last.space();
    this.d = space.dimension();
    this.smoothed = new Moments(space);
    smoothed.set(last);
    this.factor = new LowerFactor(d);
    this.gain = new DMatrixRMaj(d, d);
    this.change = new DMatrixRMaj(d, d);
    this.product = new DMatrixRMaj(d, d);
    this.difference = new DMatrixRMaj(d, 1);
    this.correction = new DMatrixRMaj(d, 1);
  }

  /** The estimate smoothed last. */
  Moments smoothed() {
    return smoothed;
  }

  /** Smooths a step, given that the next is smoothed. */
  void smooth(RecordedStep step, RecordedStep next) {
    Conditional conditional = next.conditional();
    if (conditional == null) {
      fillGain(next);
    } else {
      gain.setTo(conditional.gain());
    }
    space.difference(smoothed.mean(), next.predictedMean(), difference.data);
    CommonOps_DDRM.mult(gain, difference, correction);
    if (conditional == null) {
      addCovariance(step.filtered().covariance(), next.predicted());
    } else {
      spread(conditional.rest(), next);
    }
    space.displace(step.filtered().mean(), correction.data, smoothed.changeMean());
    if (!Checks.allFinite(smoothed.mean())
        || SymmetricMatrix.firstNotFinite(smoothed.covariance()) >= 0) {
      throw new ArithmeticException("smoothed estimate is not finite at t = " + step.time() + " s");
    }
  }

  /** G = C P'^-1, row by row, by solving against the factor of P'. */
  private void fillGain(RecordedStep next) {
    if (!factor.factorSemidefinite(next.predicted())) {
      throw new ArithmeticException("predicted covariance is not positive semi-definite: "
          + factor.failure() + " (at t = " + next.time() + " s)");
    }
    gain.setTo(next.cross());
    for (int row = 0; row < d; row++) {
      factor.solve(gain.data, row * d);
    }
  }

  /** P + G (P_s+ - P') G', symmetric by construction. */
  private void addCovariance(DMatrixRMaj filtered, DMatrixRMaj predicted) {
    CommonOps_DDRM.subtract(smoothed.covariance(), predicted, change);
    CommonOps_DDRM.mult(gain, change, product);
    DMatrixRMaj covariance = smoothed.changeCovariance();
    covariance.setTo(filtered);
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

  /** F F' + G P_s+ G', by reduction of [F, G S_s+]. */
  private void spread(DMatrixRMaj rest, RecordedStep next) {
    if (!smoothed.factor()) {
      throw new ArithmeticException("smoothed covariance is not positive semi-definite: "
          + smoothed.factorFailure() + " (at t = " + next.time() + " s)");
    }
    CommonOps_DDRM.mult(gain, smoothed.lowerFactor(), product);
    DMatrixRMaj lower = smoothed.changeFactor();
    lower.setTo(rest);
    Householder.reduceLower(lower.data, d, product.data, d, d);
  }
}

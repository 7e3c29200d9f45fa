package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * The estimate given a measurement. With S = L L' the covariance of the innovation nu and C = B W the
 * cross-covariance, G = C L^-T: mean + G L^-1 nu, P - G G'. Confined to one thread.
 */
final class Posterior {
  private final Space space;
  private final Moments moments;
  private final double[] gainRows;
  private final double[] negatives;
  private final double[] column;
  private final double[] correction;

  Posterior(Space state, int measurementDimension) {
    this.space = state;
    this.moments = new Moments(state);
    this.gainRows = new double[measurementDimension * state.dimension()];
    this.negatives = new double[measurementDimension];
    Arrays.fill(negatives, -1);
    this.column = new double[measurementDimension];
    this.correction = new double[state.dimension()];
  }

  Moments moments() {
    return moments;
  }

  /** Sets the covariance, and the mean by the innovation. */
  void condition(Moments prior, MatchingWorkspace matching, Innovation innovation) {
    fillCovariance(prior, matching, innovation);
    double[] whitened = innovation.whitened();
    int d = correction.length;
    Arrays.fill(correction, 0);
    for (int j = 0; j < whitened.length; j++) {
      for (int r = 0; r < d; r++) {
        correction[r] += gainRows[j * d + r] * whitened[j];
      }
    }
    space.displace(prior.mean(), correction, moments.changeMean());
  }

  /** Sets the covariance, and the mean to one found otherwise. */
  void condition(Moments prior, MatchingWorkspace matching, Innovation innovation, double[] mean) {
    fillCovariance(prior, matching, innovation);
    System.arraycopy(mean, 0, moments.changeMean(), 0, mean.length);
  }

  /** P - G G', with the rows of G' at hand. */
  private void fillCovariance(Moments prior, MatchingWorkspace matching, Innovation innovation) {
    fillGainRows(matching, innovation);
    int d = correction.length;
    double[] p = prior.covariance().data;
    double[] lower = moments.changeCovariance().data;
    Products.fillInnerProduct(gainRows, negatives, negatives.length, d, lower);
    for (int r = 0; r < d; r++) {
      for (int c = 0; c <= r; c++) {
        lower[r * d + c] += p[r * d + c];
      }
    }
    SymmetricMatrix.mirrorLower(moments.covariance());
  }

  /** G' = L^-1 W' B', m x d, a row of W at a time. */
  private void fillGainRows(MatchingWorkspace matching, Innovation innovation) {
    double[] b = matching.inputFactor().data;
    double[] w = matching.unitCrossCovariance().data;
    int k = matching.unitCrossCovariance().numRows;
    int m = column.length;
    int d = correction.length;
    Arrays.fill(gainRows, 0);
    for (int a = 0; a < k; a++) {
      System.arraycopy(w, a * m, column, 0, m);
      innovation.whiten(column);
      for (int j = 0; j < m; j++) {
        double factor = column[j];
        for (int r = 0; r < d; r++) {
          gainRows[j * d + r] += factor * b[r * k + a];
        }
      }
    }
  }

  /** Whether the result can be an estimate. */
  StepStatus check() {
    if (!Checks.allFinite(moments.mean())) {
      return StepStatus.RESULT_NOT_FINITE;
    }
    if (moments.factor()) {
      return StepStatus.APPLIED;
    }
    return SymmetricMatrix.firstNotFinite(moments.covariance()) < 0
        ? StepStatus.NOT_DEFINITE
        : StepStatus.RESULT_NOT_FINITE;
  }
}

package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * The estimate given a measurement. With S = L L' the covariance of the innovation nu and C = B W the
 * cross-covariance, G = C L^-T: mean + G L^-1 nu, P - G G'. Confined to one thread.
 */
final class Posterior {
  private final Space space;
  private final Moments moments;
  private final DMatrixRMaj gainFactor;
  private final double[] column;
  private final double[] correction;

  Posterior(Space state, int measurementDimension) {
    this.space = state;
    this.moments = new Moments(state);
    this.gainFactor = new DMatrixRMaj(state.dimension(), measurementDimension);
    this.column = new double[measurementDimension];
    this.correction = new double[state.dimension()];
  }

  Moments moments() {
    return moments;
  }

  /** Sets the covariance, and the mean by the innovation. */
  void condition(Moments prior, MatchingWorkspace matching, Innovation innovation) {
    fillCovariance(prior, matching, innovation);
    double[] g = gainFactor.data;
    double[] whitened = innovation.whitened();
    int m = whitened.length;
    for (int r = 0; r < correction.length; r++) {
      double shift = 0;
      for (int j = 0; j < m; j++) {
        shift += g[r * m + j] * whitened[j];
      }
      correction[r] = shift;
    }
    space.displace(prior.mean(), correction, moments.changeMean());
  }

  /** Sets the covariance, and the mean to one found otherwise. */
  void condition(Moments prior, MatchingWorkspace matching, Innovation innovation, double[] mean) {
    fillCovariance(prior, matching, innovation);
    System.arraycopy(mean, 0, moments.changeMean(), 0, mean.length);
  }

  private void fillCovariance(Moments prior, MatchingWorkspace matching, Innovation innovation) {
    fillGainFactor(matching, innovation);
    double[] lower = moments.changeCovariance().data;
    int d = correction.length;
    Products.fillDifference(prior.covariance().data, gainFactor.data, d, column.length, lower);
    SymmetricMatrix.mirrorLower(moments.covariance());
  }

  /** G = B (L^-1 W')', formed row by row of W. */
  private void fillGainFactor(MatchingWorkspace matching, Innovation innovation) {
    double[] b = matching.inputFactor().data;
    double[] w = matching.unitCrossCovariance().data;
    double[] g = gainFactor.data;
    int k = matching.unitCrossCovariance().numRows;
    int m = column.length;
    Arrays.fill(g, 0);
    for (int a = 0; a < k; a++) {
      System.arraycopy(w, a * m, column, 0, m);
      innovation.whiten(column);
      for (int r = 0; r < correction.length; r++) {
        double factor = b[r * k + a];
        for (int j = 0; j < m; j++) {
          g[r * m + j] += factor * column[j];
        }
      }
    }
  }

  /** Whether the result can be an estimate. */
  StepStatus check() {
    if (!Checks.allFinite(moments.mean())
        || SymmetricMatrix.firstNotFinite(moments.covariance()) >= 0) {
      return StepStatus.RESULT_NOT_FINITE;
    }
    return moments.factor() ? StepStatus.APPLIED : StepStatus.NOT_DEFINITE;
  }
}

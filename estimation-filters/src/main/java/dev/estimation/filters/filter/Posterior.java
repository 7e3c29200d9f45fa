package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.RowOrder;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * The estimate given a measurement: with R = [B U^-T, E] from {@link UnitLeastSquares}, E what the inputs that
 * are not active have of their own, the covariance is R R' and the mean m + B U^-T z. In exact arithmetic the
 * same as m + K nu, P - K S K'; positive semi-definite by construction. R is lower triangular in the order of the
 * inputs, so the new lower factor is there without another decomposition, in either form. Confined to one thread.
 */
final class Posterior {
  private final Space space;
  private final MatchingWorkspace matching;
  private final Moments moments;
  private final RowOrder naturalOrder;
  private final double[] correction;

  Posterior(Space state, MatchingWorkspace matching) {
    this.space = state;
    this.matching = matching;
    int d = state.dimension();
    this.moments = new Moments(state);
    this.naturalOrder = new RowOrder(matching.inputOrder(), RowOrder.natural(d));
    this.correction = new double[d];
  }

  Moments moments() {
    return moments;
  }

  /** Conditions the prior by a reduced update, at whose centre the matching must stand. */
  StepStatus condition(Moments prior, UnitLeastSquares squares) {
    int d = correction.length;
    double[] root = moments.changeFactor().data;
    squares.fillRoot(matching.inputFactor().data, d, root);
    Arrays.fill(correction, 0);
    for (int c = 0; c < matching.activeInputs(); c++) {
      double target = squares.target(c);
      for (int r = 0; r < d; r++) {
        correction[r] += root[r * d + c] * target;
      }
    }
    space.displace(prior.mean(), correction, moments.changeMean());
    return finish(root, squares);
  }

  /** Takes the covariance of a reduced update and a mean found otherwise. */
  StepStatus take(UnitLeastSquares squares, double[] mean) {
    double[] root = moments.changeFactor().data;
    squares.fillRoot(matching.inputFactor().data, correction.length, root);
    System.arraycopy(mean, 0, moments.changeMean(), 0, mean.length);
    return finish(root, squares);
  }

  private StepStatus finish(double[] root, UnitLeastSquares squares) {
    // A factor is at most as large as that of the prior, so the covariance is finite if U is.
    if (!Checks.allFinite(moments.mean()) || !squares.isFinite()) {
      return StepStatus.RESULT_NOT_FINITE;
    }
    naturalOrder.apply(root);
    return moments.factor() ? StepStatus.APPLIED : StepStatus.NOT_DEFINITE;
  }
}

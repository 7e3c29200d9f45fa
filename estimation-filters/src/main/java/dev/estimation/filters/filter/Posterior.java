package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Householder;
import dev.estimation.core.internal.Products;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * The estimate given a measurement: with R = [B U^-T, E] from {@link UnitLeastSquares}, E what the inputs that
 * are not active have of their own, the covariance is R R' and the mean m + B U^-T z. In exact arithmetic the
 * same as m + K nu, P - K S K'; positive semi-definite by construction. Where the active inputs come first, R is
 * the new lower factor itself. Confined to one thread.
 */
final class Posterior {
  private final Space space;
  private final MatchingWorkspace matching;
  private final Form form;
  private final Moments moments;
  private final double[] root;
  private final double[] ones;
  private final double[] correction;

  Posterior(Space state, MatchingWorkspace matching, Form form) {
    this.space = state;
    this.matching = matching;
    this.form = form;
    int d = state.dimension();
    this.moments = new Moments(state);
    this.root = new double[d * d];
    this.ones = new double[d];
    Arrays.fill(ones, 1);
    this.correction = new double[d];
  }

  Moments moments() {
    return moments;
  }

  /** Conditions the prior by a reduced update, at whose centre the matching must stand. */
  StepStatus condition(Moments prior, UnitLeastSquares squares) {
    int d = correction.length;
    int k = matching.activeInputs();
    squares.fillRoot(matching.inputFactor().data, d, root);
    Arrays.fill(correction, 0);
    for (int c = 0; c < k; c++) {
      double target = squares.target(c);
      for (int r = 0; r < d; r++) {
        correction[r] += root[r * d + c] * target;
      }
    }
    space.displace(prior.mean(), correction, moments.changeMean());
    return finish();
  }

  /** Takes the covariance of a reduced update and a mean found otherwise. */
  StepStatus take(UnitLeastSquares squares, double[] mean) {
    squares.fillRoot(matching.inputFactor().data, correction.length, root);
    System.arraycopy(mean, 0, moments.changeMean(), 0, mean.length);
    return finish();
  }

  private StepStatus finish() {
    // Squares, so that the covariance is finite too.
    if (!Checks.allFinite(moments.mean()) || !(Products.sumOfSquares(root) <= Double.MAX_VALUE)) {
      return StepStatus.RESULT_NOT_FINITE;
    }
    int d = correction.length;
    if (matching.isInputFactorLower()) {
      System.arraycopy(root, 0, moments.changeFactor().data, 0, root.length);
    } else if (form == Form.SQUARE_ROOT) {
      double[] lower = moments.changeFactor().data;
      Arrays.fill(lower, 0, d * d, 0);
      Householder.reduceLower(lower, d, root, d, d);
    } else {
      Products.fillOuterProduct(
          root, ones, d, d, moments.factoredCovariance().changeLowerTriangle().data);
    }
    return moments.factor() ? StepStatus.APPLIED : StepStatus.NOT_DEFINITE;
  }
}

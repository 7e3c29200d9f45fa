package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * The estimate given a measurement: mean m + D' z and covariance D'D + E E', with D and z from {@link
 * UnitLeastSquares} and E the factor of what the inputs that are not active have of their own. In exact
 * arithmetic the same as m + K nu, P - K S K'; positive semi-definite by construction. Confined to one
 * thread.
 */
final class Posterior {
  private final Space space;
  private final MatchingWorkspace matching;
  private final Moments moments;
  private final int active;
  private final double[] root;
  private final double[] ones;
  private final double[] correction;

  Posterior(Space state, MatchingWorkspace matching) {
    this.space = state;
    this.matching = matching;
    int d = state.dimension();
    this.moments = new Moments(state);
    this.active = matching.unitCrossCovariance().numRows;
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
    fillCovariance(squares);
    int d = correction.length;
    Arrays.fill(correction, 0);
    for (int c = 0; c < active; c++) {
      double target = squares.target(c);
      for (int r = 0; r < d; r++) {
        correction[r] += root[c * d + r] * target;
      }
    }
    space.displace(prior.mean(), correction, moments.changeMean());
    return check();
  }

  /** Takes the covariance of a reduced update and a mean found otherwise. */
  StepStatus take(UnitLeastSquares squares, double[] mean) {
    fillCovariance(squares);
    System.arraycopy(mean, 0, moments.changeMean(), 0, mean.length);
    return check();
  }

  /** D'D plus what the inactive inputs have of their own: a sum of squares, nothing subtracted. */
  private void fillCovariance(UnitLeastSquares squares) {
    int d = correction.length;
    squares.fillRoot(matching.inputFactor(), root);
    double[] rest = matching.restFactor().data;
    int others = d - active;
    for (int c = 0; c < others; c++) {
      for (int r = 0; r < d; r++) {
        root[(active + c) * d + r] = rest[r * others + c];
      }
    }
    Products.fillInnerProduct(root, ones, d, d, moments.changeCovariance().data);
    SymmetricMatrix.mirrorLower(moments.covariance());
  }

  /** Whether the result can be an estimate. */
  private StepStatus check() {
    if (!Checks.allFinite(moments.mean())) {
      return StepStatus.RESULT_NOT_FINITE;
    }
    if (moments.factor()) {
      return StepStatus.APPLIED;
    }
    return SymmetricMatrix.allFinite(moments.covariance())
        ? StepStatus.NOT_DEFINITE
        : StepStatus.RESULT_NOT_FINITE;
  }
}

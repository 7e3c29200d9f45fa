package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * The estimate given a measurement: mean m + D' z and covariance P - B B' + D'D, with D and z from {@link
 * UnitLeastSquares}. P - B B' is what the inputs that are not active have of their own; the rows of active
 * ones are zero and are not computed. In exact arithmetic the same as m + K nu, P - K S K'. Confined to
 * one thread.
 */
final class Posterior {
  private final Space space;
  private final MatchingWorkspace matching;
  private final Moments moments;
  private final boolean[] active;
  private final double[] root;
  private final double[] ones;
  private final double[] correction;

  Posterior(Space state, MatchingWorkspace matching) {
    this.space = state;
    this.matching = matching;
    int k = matching.unitCrossCovariance().numRows;
    int d = state.dimension();
    this.moments = new Moments(state);
    this.active = new boolean[d];
    for (int input : matching.activeInputs()) {
      active[input] = true;
    }
    this.root = new double[k * d];
    this.ones = new double[k];
    Arrays.fill(ones, 1);
    this.correction = new double[d];
  }

  Moments moments() {
    return moments;
  }

  /** Conditions the prior by a reduced update, at whose centre the matching must stand. */
  StepStatus condition(Moments prior, UnitLeastSquares squares) {
    fillCovariance(prior, squares);
    int d = correction.length;
    Arrays.fill(correction, 0);
    for (int c = 0; c < ones.length; c++) {
      double target = squares.target(c);
      for (int r = 0; r < d; r++) {
        correction[r] += root[c * d + r] * target;
      }
    }
    space.displace(prior.mean(), correction, moments.changeMean());
    return check();
  }

  /** Takes the covariance of a reduced update and a mean found otherwise. */
  StepStatus condition(Moments prior, UnitLeastSquares squares, double[] mean) {
    fillCovariance(prior, squares);
    System.arraycopy(mean, 0, moments.changeMean(), 0, mean.length);
    return check();
  }

  private void fillCovariance(Moments prior, UnitLeastSquares squares) {
    squares.fillRoot(matching.inputFactor(), root);
    int d = correction.length;
    double[] lower = moments.changeCovariance().data;
    Products.fillInnerProduct(root, ones, ones.length, d, lower);
    if (ones.length < d) {
      addInactive(prior.covariance().data, matching.inputFactor().data, lower);
    }
    SymmetricMatrix.mirrorLower(moments.covariance());
  }

  /** Adds P - B B' where neither input is active. */
  private void addInactive(double[] p, double[] b, double[] lower) {
    int d = correction.length;
    int k = ones.length;
    for (int r = 0; r < d; r++) {
      for (int c = 0; c <= r && !active[r]; c++) {
        if (!active[c]) {
          double sum = p[r * d + c];
          for (int a = 0; a < k; a++) {
            sum -= b[r * k + a] * b[c * k + a];
          }
          lower[r * d + c] += sum;
        }
      }
    }
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

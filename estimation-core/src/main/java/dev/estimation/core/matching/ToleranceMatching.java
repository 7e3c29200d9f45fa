package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;

/**
 * Moments to a stated tolerance: as many points as it takes, where it takes them. Nothing but the tolerance is
 * chosen.
 *
 * <pre>{@code
 * MomentMatching matching = ToleranceMatching.within(0.01);
 * }</pre>
 *
 * <p><b>What is within the tolerance.</b> The errors of mean, covariance and cross-covariance where they are used, as {@code
 * MatchingError} in {@code core.accuracy} has them: for a prediction in standard deviations of P_zz + Q, for an update in those
 * of U + R, U what a regression on the input does not explain. 0.01 is a mean wrong by a hundredth of a standard deviation,
 * or a variance wrong by one per cent. Noise that is given makes it cheaper.
 *
 * <p><b>How.</b> In unit coordinates xi of the inputs that are not linear, k of them, g is written as a sum of Hermite
 * polynomials with coefficients c from values at nested nodes. E z = c_0, W holds those of degree 1, and U = sum c c' over
 * the others is positive semi-definite whatever the weights. First come the centre, two points on every axis, and a pair of
 * <i>probes</i> +v, -v off the axes. What the sum misses at the probes counts as error until a term explains it: c_3 and
 * c_4 of an axis, products of axes. What is missed of even degree may move the mean by a share of it, as far as the
 * function bends along an axis; of odd degree, W by all of it; both enter U by their squares, and by the product with the
 * terms that are known. With a Jacobian, slopes at the mean are compared as well. Of two axes that bend, the product is expected
 * to be that of a function of a linear combination of them. From the second level on, the last two terms of an axis are
 * taken for what follows. While the estimate is above the tolerance, terms are added, an axis or a product of axes at a time,
 * those first from which most is expected for each point. From three axes on, a sum that was refined is held against a
 * fresh pair of probes before it passes.
 *
 * <p><b>What it cannot see.</b> Features between its points; a misfit that vanishes at the probes by chance. On random
 * problems of sixteen kinds, without derivatives or linear inputs, at tolerances of 0.1, 0.01 and 0.001 the true error was
 * inside the tolerance in 99 % of cases or more, and the estimate not below the true error by more than a hundredth of the
 * tolerance in 95 % or more; the repository's DEVELOPERS file has the table.
 *
 * <p><b>When it cannot.</b> The status is {@link MatchingStatus#BELOW_TOLERANCE}, the moments are the best there are, and {@link
 * MatchingWorkspace#failure()} says why: the budget of evaluations has ended, maybe before fresh probes; an angle of the
 * output would pass half a turn from the centre's; values further out are not finite. A function that is not smooth at the
 * scale of the spread, such as a range whose spread reaches its origin, ends so, and so does one whose Jacobian is wrong. Values
 * that are not finite at the first points on the axes are {@link MatchingStatus#FUNCTION_NOT_FINITE}.
 *
 * <p><b>Order of inputs.</b> Axis j of xi moves input j and those after it in the order of the active inputs. Where
 * inputs are correlated, name those first in which the function bends: fewer axes bend then.
 *
 * <p>Special input: inputs of zero variance take no points; a function that is linear in all inputs takes one
 * evaluation (and a Jacobian). Differences are those of the spaces; means of rotations are the first step from the centre's
 * image. Errors below 16 roundings of g are not seen, nor those in a direction in which outputs differ by less than a
 * millionth of their deviations.
 *
 * <p>Cost: 2 k + 3 evaluations at least; where linear inputs have no Jacobian, each takes one more for each of
 * them. One Jacobian at the mean where there is one, or at every point if there are linear inputs. Arithmetic grows
 * with the square of the number of terms added. For each evaluation of the budget a workspace takes 32 bytes for
 * each output, times 1 + the linear inputs, and 5 for each input; nothing is allocated later. <i>Immutable.</i> Sources: Genz
 * and Keister 1996, <i>Fully symmetric interpolatory rules</i> (nodes); Gerstner and Griebel 2003, <i>Dimension-adaptive tensor-product quadrature</i>; Constantine, Eldred and
 * Phipps 2012, <i>Sparse pseudospectral approximation method</i> (the last from memory). Estimate and probes are our own.
 */
public final class ToleranceMatching implements MomentMatching {
  private static final int BUDGET = 500;
  private static final int MOST = 100_000;

  private final double tolerance;
  private final int budget;

  private ToleranceMatching(double tolerance, int budget) {
    this.tolerance = tolerance;
    this.budget = budget;
  }

  /**
   * {@return matching to a tolerance, with at most 500 evaluations a call}
   *
   * @param tolerance above 0; from 0.1 to 0.001 is sensible
   */
  public static ToleranceMatching within(double tolerance) {
    Checks.finite("tolerance", tolerance);
    if (!(tolerance > 0)) {
      throw new IllegalArgumentException("tolerance must be above 0, got " + tolerance);
    }
    return new ToleranceMatching(tolerance, BUDGET);
  }

  /**
   * {@return the same with another budget}
   *
   * @param evaluations the most that a call may take; a workspace needs enough for the first points
   */
  public ToleranceMatching withBudget(int evaluations) {
    if (evaluations < 1 || evaluations > MOST) {
      throw new IllegalArgumentException(
          "budget must be from 1 to " + MOST + " evaluations, got " + evaluations);
    }
    return new ToleranceMatching(tolerance, evaluations);
  }

  @Override
  public MatchingWorkspace workspace(
      Space input, Space output, VectorFunction function, Form form) {
    return new ToleranceWorkspace(input, output, function, tolerance, budget, form);
  }
}

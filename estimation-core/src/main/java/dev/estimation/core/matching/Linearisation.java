package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.space.Space;

/**
 * First-order linearisation about the mean: mean = g(m), P_zz = G P G', W = (G B)', with G the
 * Jacobian at the mean.
 *
 * <p>Formed as W'W, so P_zz is positive semi-definite by construction. Zero variances are valid; NaN
 * in the Jacobian is the status {@link MatchingStatus#JACOBIAN_NOT_FINITE}. Accuracy: to
 * leading order the mean of component i errs by tr(H_i P) / 2 and the covariance of i and j misses tr(H_i P
 * H_j P) / 2, H the Hessians; nothing in the result tells how large these are.
 *
 * <p>Cost: 1 evaluation and 1 Jacobian, analytic where the function has one. Where it has none, input
 * scales must be given, one for each input, and central differences take 2 evaluations more for each
 * active input. A motion with noise inside has state and noise as its inputs: its scales do not fit a
 * sensor, so one of the two must know its Jacobian.
 * <i>Immutable.</i> Source: Jazwinski 1970, <i>Stochastic Processes and Filtering Theory</i>, section
 * 8.3 (from memory).
 */
public final class Linearisation implements MomentMatching {
  private final double[] inputScales;

  private Linearisation(double[] inputScales) {
    this.inputScales = inputScales;
  }

  /** {@return first-order linearisation of functions that have a Jacobian} */
  public static Linearisation firstOrder() {
    return new Linearisation(null);
  }

  /**
   * The same, with central differences for functions that have no Jacobian of their own.
   *
   * @param inputScales for each input, a length over which the functions bend noticeably, in its
   *     unit; finite and above 0; copied. See {@code CentralDifferences}
   * @return the matching
   */
  public Linearisation withInputScales(double... inputScales) {
    return new Linearisation(inputScales.clone());
  }

  @Override
  public MatchingWorkspace workspace(
      Space input, Space output, VectorFunction function, Form form) {
    return new LinearWorkspace(input, output, function, inputScales, form);
  }
}

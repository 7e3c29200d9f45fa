package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.space.Space;

/**
 * Linearisation about the mean, of first or second order.
 *
 * <p>First: mean = g(m), P_zz = G P G', W = (G B)', with G the Jacobian at the mean. Second: with H_i the
 * Hessian of output i and M_i = B' H_i B, the mean of i gets tr(H_i P) / 2 = tr(M_i) / 2 more, the
 * covariance of i and j gets tr(H_i P H_j P) / 2 = tr(M_i M_j) / 2 more; W is the same. Over active
 * inputs, in unit coordinates: P_zz is a sum of squares, W'W and a sum of products of entries of M,
 * so it is positive semi-definite by construction, and what regression leaves unexplained is the second
 * sum and the noise, nothing subtracted.
 *
 * <p>Zero variances are valid; NaN in a derivative is the status {@link
 * MatchingStatus#JACOBIAN_NOT_FINITE}. Accuracy: the first order is exact for affine functions, the
 * second for quadratic ones. What the second adds is what the first misses to leading order; nothing in
 * the result tells how large the next terms are. Both see the mean alone: where g bends back within the
 * spread, the second may be worse than the first.
 *
 * <p>Cost, k active inputs: 1 evaluation, 1 Jacobian and for the second order 1 Hessian, analytic where
 * the function has them. Where it has not, input scales must be given, one for each input. A Jacobian
 * by central differences then costs 2 k evaluations more; a Hessian 2 k Jacobians more, or 2 k^2 + 1
 * evaluations if there is no Jacobian either. {@code jacobians()} counts the first and those that
 * differences take, {@code evaluations()} every call of g; analytic Hessians, one a call, are not counted.
 * Projecting Hessians takes about m k^3 / 2 operations. A motion with noise inside has state and noise
 * as its inputs: its scales do not fit a sensor, so one of the two must know its derivatives; {@link
 * SpreadLinearisation} needs neither. <i>Immutable.</i>
 *
 * <p>Source: Jazwinski 1970, <i>Stochastic Processes and Filtering Theory</i>, section 8.3 and chapter 9;
 * Athans, Wishner and Bertolini 1968, <i>Suboptimal state estimation for continuous-time nonlinear
 * systems from discrete noisy measurements</i>, IEEE Transactions on Automatic Control 13(5) (both from
 * memory).
 */
public final class Linearisation implements MomentMatching {
  private final boolean secondOrder;
  private final double[] inputScales;

  private Linearisation(boolean secondOrder, double[] inputScales) {
    this.secondOrder = secondOrder;
    this.inputScales = inputScales;
  }

  /** {@return first-order linearisation of functions that have a Jacobian} */
  public static Linearisation firstOrder() {
    return new Linearisation(false, null);
  }

  /** {@return second-order linearisation of functions that have a Jacobian and a Hessian} */
  public static Linearisation secondOrder() {
    return new Linearisation(true, null);
  }

  /**
   * The same, with central differences for the derivatives that a function does not have.
   *
   * @param inputScales for each input, a length over which the functions bend noticeably, in its
   *     unit; finite and above 0; copied. See {@code CentralDifferences}
   * @return the matching
   */
  public Linearisation withInputScales(double... inputScales) {
    return new Linearisation(secondOrder, inputScales.clone());
  }

  @Override
  public MatchingWorkspace workspace(
      Space input, Space output, VectorFunction function, Form form) {
    DerivativeSource source = secondOrder
        ? DerivativeSource.secondOrder(input, output, function, inputScales)
        : DerivativeSource.firstOrder(input, output, function, inputScales);
    return new LinearWorkspace(input, output, function, source, form);
  }
}

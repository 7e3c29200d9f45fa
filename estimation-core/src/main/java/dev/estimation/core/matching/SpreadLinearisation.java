package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.space.Space;

/**
 * Linearisation by differences over the spread of the input: a polynomial through values of g at m and
 * m +- h L e_a, along the columns of the lower factor L, takes the place of the Taylor polynomial.
 *
 * <p>With d_a+ and d_a- the deviations g(m +- h L e_a) - g(m) and h = sqrt 3, the length that suits the
 * fourth moment of a Gaussian:
 *
 * <ul>
 *   <li>First order: mean = g(m), row a of W is (d_a+ - d_a-) / (2 h), P_zz = W'W.
 *   <li>Second order adds the bends of {@link Linearisation}, M_aa = (d_a+ + d_a-) / h^2 and from two
 *       more points M_ab = ((d_ab+ + d_ab-) / h^2 - M_aa - M_bb) / 2, d_ab+- the deviations at m +- h
 *       L (e_a + e_b): the mean gets sum M_aa / 2 more, P_zz gets sum M_ab M_ab' / 2 more.
 *   <li>Second order along axes leaves M_ab with a != b at zero. P_zz then gets (h^2 - 1) / (4 h^4) times
 *       the sum of the squares of d_a+ + d_a-, since (h^2 - 1) / 2 = 1.
 * </ul>
 *
 * <p>No Jacobian and no input scales: it serves every function, also motions with noise inside. All is a
 * sum of squares, so P_zz is positive semi-definite by construction and what W leaves unexplained is
 * formed without subtraction. Zero variances give steps of zero, and zeros.
 *
 * <p>Accuracy: exact for affine functions, second order also for quadratic ones, along axes for those
 * without products of different unit coordinates. Points lie 1.7 standard deviations out, those of
 * pairs 2.4: g must be defined there, and deviations of angles stay within half a turn.
 *
 * <p>Cost for k active inputs: 2 k + 1 evaluations; with products 1 + k + k^2. <i>Immutable.</i>
 * Source: Norgaard, Poulsen and Ravn 2000, <i>New developments in state estimation for nonlinear
 * systems</i>, Automatica 36, first and second order (from memory); they have the second order along
 * axes, the products are our completion.
 */
public final class SpreadLinearisation implements MomentMatching {
  /** How much of the second degree is taken. */
  enum Bends {
    NONE,
    ALONG_AXES,
    ALL
  }

  private final Bends bends;

  private SpreadLinearisation(Bends bends) {
    this.bends = bends;
  }

  /** {@return first order: slopes over the spread} */
  public static SpreadLinearisation firstOrder() {
    return new SpreadLinearisation(Bends.NONE);
  }

  /** {@return second order, products of different unit coordinates included} */
  public static SpreadLinearisation secondOrder() {
    return new SpreadLinearisation(Bends.ALL);
  }

  /** {@return second order along each axis alone, at the evaluations of the first} */
  public static SpreadLinearisation secondOrderAlongAxes() {
    return new SpreadLinearisation(Bends.ALONG_AXES);
  }

  @Override
  public MatchingWorkspace workspace(
      Space input, Space output, VectorFunction function, Form form) {
    return new SpreadWorkspace(input, output, function, bends, form);
  }
}

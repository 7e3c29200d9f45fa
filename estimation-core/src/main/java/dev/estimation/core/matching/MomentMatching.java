package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.space.Space;

/**
 * A way of carrying a mean and covariance through a nonlinear function. <i>Immutable.</i>
 *
 * <p>Every matching is exact for affine functions, takes zero variances, and uses what the function
 * tells of its structure.
 */
public interface MomentMatching {
  /**
   * Scratch for one function and one thread, with all sizes known.
   *
   * @param input where u lives
   * @param output where g(u) lives
   * @param function g
   * @param form how the covariance of the output is made
   * @return the workspace
   * @throws IllegalArgumentException if this matching cannot serve the function: no Jacobian, too
   *     many points, active inputs that the space does not have
   */
  MatchingWorkspace workspace(Space input, Space output, VectorFunction function, Form form);

  /**
   * Scratch in covariance form; see {@link #workspace(Space, Space, VectorFunction, Form)}.
   *
   * @param input where u lives
   * @param output where g(u) lives
   * @param function g
   * @return the workspace
   */
  default MatchingWorkspace workspace(Space input, Space output, VectorFunction function) {
    return workspace(input, output, function, Form.COVARIANCE);
  }

  /**
   * This matching over the whole input, also where the function reads a part of it or is linear in some. For
   * comparison with results that were made so; it costs more and is as a rule not more accurate.
   *
   * @return the matching over the whole input
   */
  default MomentMatching overWholeInput() {
    return (input, output, function, form) -> workspace(
        input,
        output,
        new Restructured(function, function.structure().withAllInputsActive()),
        form);
  }
}

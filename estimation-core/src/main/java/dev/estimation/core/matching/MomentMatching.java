package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
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
   * @return the workspace
   * @throws IllegalArgumentException if this matching cannot serve the function: no Jacobian, too
   *     many points, active inputs that the space does not have
   */
  MatchingWorkspace workspace(Space input, Space output, VectorFunction function);

  /**
   * This matching over the whole input, also where the function reads a part of it. For comparison
   * with results that were made so; it costs more and is as a rule not more accurate.
   *
   * @return the matching over the whole input
   */
  default MomentMatching overWholeInput() {
    return (input, output, function) -> workspace(input, output, new WholeInput(function));
  }
}

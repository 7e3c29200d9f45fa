package dev.estimation.core.function;

/**
 * A function z = g(u, given) of a vector u, with anything else that it needs to know given.
 *
 * <p>Implementations are called by many threads at once and must not keep state that changes. They
 * may throw; whoever called for the step then sees the exception, with nothing changed.
 */
@FunctionalInterface
public interface VectorFunction {
  /**
   * Fills {@code output} with g(input, given).
   *
   * @param input read, never kept
   * @param given read, never kept
   * @param output filled, never kept; arrives filled with NaN, so that a component left out is
   *     noticed
   */
  void evaluate(double[] input, double[] given, double[] output);

  /** {@return what is known of this function; must not change over its life} */
  default Structure structure() {
    return Structure.UNKNOWN;
  }
}

package dev.estimation.core.function;

/** The second partial derivatives of a function. As free of state as the function itself. */
@FunctionalInterface
public interface Hessian {
  /**
   * Fills {@code hessians} with d2g_i / (du_j du_l) at {@code input}, one symmetric matrix for each
   * output, one after the other.
   *
   * @param input read, never kept
   * @param given read, never kept
   * @param hessians filled: entry (i, j, l) at index {@code (i * n + j) * n + l}, with n the dimension
   *     of the input space; entries with l &lt;= j are read, the others need not be written; arrives
   *     filled with zeros, so that only what differs from them need be written
   */
  void evaluate(double[] input, double[] given, double[] hessians);
}

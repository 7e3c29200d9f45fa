package dev.estimation.core.function;

/** The matrix of partial derivatives of a function. As free of state as the function itself. */
@FunctionalInterface
public interface Jacobian {
  /**
   * Fills {@code jacobian} with dg_i / du_j at {@code input}.
   *
   * @param input read, never kept
   * @param given read, never kept
   * @param jacobian filled row by row: entry (i, j) at index {@code i * n + j}, with n the dimension
   *     of the input space; arrives filled with zeros, so that only the others need be written
   */
  void evaluate(double[] input, double[] given, double[] jacobian);
}

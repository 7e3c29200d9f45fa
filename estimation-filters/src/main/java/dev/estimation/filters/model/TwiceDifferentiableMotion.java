package dev.estimation.filters.model;

/** A motion model that knows its Jacobian and its Hessian. */
public interface TwiceDifferentiableMotion extends DifferentiableMotion {
  /**
   * Fills {@code hessians} with d2f_i / (dx_j dx_l), one symmetric matrix for each component.
   *
   * @param state read, never kept
   * @param control read, never kept
   * @param time at the start (s)
   * @param dt duration (s), above 0
   * @param hessians filled: entry (i, j, l) at index {@code (i * d + j) * d + l}; entries with l &lt;= j
   *     are read, the others need not be written; arrives filled with zeros
   */
  void moveHessian(double[] state, double[] control, double time, double dt, double[] hessians);
}

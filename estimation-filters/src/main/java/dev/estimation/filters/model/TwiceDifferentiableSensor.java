package dev.estimation.filters.model;

/** A sensor model that knows its Jacobian and its Hessian. */
public interface TwiceDifferentiableSensor extends DifferentiableSensor {
  /**
   * Fills {@code hessians} with d2h_i / (dx_j dx_l), one symmetric matrix for each component.
   *
   * @param state read, never kept
   * @param given read, never kept
   * @param hessians filled: entry (i, j, l) at index {@code (i * d + j) * d + l}, d the dimension of the
   *     state; entries with l &lt;= j are read, the others need not be written; arrives filled with zeros
   */
  void measureHessian(double[] state, double[] given, double[] hessians);
}

package dev.estimation.filters.motion;

/** A motion in continuous time that knows the Jacobian of its drift. */
public interface DifferentiableContinuousMotion extends ContinuousMotion {
  /**
   * Fills {@code jacobian} with da_i / dx_j.
   *
   * @param state read, never kept
   * @param control read, never kept
   * @param time s
   * @param jacobian filled, d x d row by row, entries in 1/s times unit_i / unit_j; arrives filled with zeros
   */
  void driftJacobian(double[] state, double[] control, double time, double[] jacobian);
}

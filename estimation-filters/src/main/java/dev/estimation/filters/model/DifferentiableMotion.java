package dev.estimation.filters.model;

/** A motion model that knows its Jacobian. */
public interface DifferentiableMotion extends MotionModel {
  /**
   * Fills {@code jacobian} with df_i / dx_j.
   *
   * @param state read, never kept
   * @param control read, never kept
   * @param time at the start (s)
   * @param dt duration (s), above 0
   * @param jacobian filled, d x d row by row; arrives filled with zeros
   */
  void moveJacobian(double[] state, double[] control, double time, double dt, double[] jacobian);
}

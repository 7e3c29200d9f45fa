package dev.estimation.filters.model;

/** A sensor model that knows its Jacobian. */
public interface DifferentiableSensor extends SensorModel {
  /**
   * Fills {@code jacobian} with dh_i / dx_j.
   *
   * @param state read, never kept
   * @param given read, never kept
   * @param jacobian filled, m x d row by row, m the dimension of the measurement, d of the state;
   *     arrives filled with zeros
   */
  void measureJacobian(double[] state, double[] given, double[] jacobian);
}

package dev.estimation.filters.model;

/** A noise-driven motion model that knows its Jacobians. */
public interface DifferentiableNoiseDrivenMotion extends NoiseDrivenMotion {
  /**
   * Fills both Jacobians. Linearisation asks for them at noise 0, points where a motion is linear in some inputs
   * at their own noise.
   *
   * @param state read, never kept
   * @param noise read, never kept
   * @param control read, never kept
   * @param time at the start (s)
   * @param dt duration (s), above 0
   * @param byState filled with df_i / dx_j, d x d row by row; arrives filled with zeros
   * @param byNoise filled with df_i / dnoise_j, d x q row by row; arrives filled with zeros
   */
  void moveJacobians(
      double[] state,
      double[] noise,
      double[] control,
      double time,
      double dt,
      double[] byState,
      double[] byNoise);
}

package dev.estimation.filters.model;

/**
 * How a state moves: x(t + dt) = f(x, control, t, dt) + w, w ~ N(0, Q).
 *
 * <p>A model that also has a Jacobian is a {@link DifferentiableMotion}, one that has a Hessian too a {@link
 * TwiceDifferentiableMotion}. The active inputs of its
 * structure are components of the state.
 */
public non-sealed interface MotionModel extends Motion {
  /**
   * Fills {@code next} with f(state, control, time, dt).
   *
   * @param state read, never kept
   * @param control read, never kept; holds over the whole of dt
   * @param time at the start (s)
   * @param dt duration (s), above 0
   * @param next filled; arrives filled with NaN, so that a component left out is noticed
   */
  void move(double[] state, double[] control, double time, double dt, double[] next);

  /**
   * Fills {@code covariance} with Q, symmetric and positive semi-definite.
   *
   * @param state the mean at the start, read, never kept
   * @param control read, never kept
   * @param time at the start (s)
   * @param dt duration (s), above 0
   * @param covariance filled, d x d row by row, d the dimension of the state space; arrives filled
   *     with zeros
   */
  void processNoise(double[] state, double[] control, double time, double dt, double[] covariance);
}

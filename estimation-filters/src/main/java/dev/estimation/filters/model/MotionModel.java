package dev.estimation.filters.model;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;

/**
 * How a state moves: x(t + dt) = f(x, control, t, dt) + w, w ~ N(0, Q).
 *
 * <p>Units are SI and radians. Implementations are called by many threads at once and must not keep
 * state that changes. A model that also has a Jacobian is a {@link DifferentiableMotion}.
 */
public interface MotionModel {
  /** {@return where the state lives} */
  Space stateSpace();

  /** {@return the number of controls that {@link #move} reads; 0 if there are none} */
  default int controlDimension() {
    return 0;
  }

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

  /** {@return the components of the state that {@link #move} reads; all unless said otherwise} */
  default Structure structure() {
    return Structure.UNKNOWN;
  }
}

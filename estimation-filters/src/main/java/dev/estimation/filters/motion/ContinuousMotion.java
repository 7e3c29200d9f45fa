package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;

/**
 * How a state moves, told by its rate of change: dx = a(x, control, t) dt + noise of spectral density D(x, control, t),
 * that is G dB with D = G G' for unit Brownian motion B. {@link IntegratedMotion} makes a motion model of it.
 *
 * <p>The state has reals and angles, no quaternions. Implementations are called by many threads at once and must not
 * keep state that changes. One that knows the Jacobian of the drift is a {@link DifferentiableContinuousMotion}.
 */
public interface ContinuousMotion {
  /** {@return where the state lives} */
  Space stateSpace();

  /** {@return the number of controls that drift and noise read; 0 if there are none} */
  default int controlDimension() {
    return 0;
  }

  /**
   * Fills {@code rate} with a(state, control, time).
   *
   * @param state read, never kept
   * @param control read, never kept
   * @param time s
   * @param rate filled, d numbers in unit/s; arrives filled with NaN
   */
  void drift(double[] state, double[] control, double time, double[] rate);

  /**
   * Fills {@code density} with D = G G', symmetric and positive semi-definite.
   *
   * @param state read, never kept
   * @param control read, never kept
   * @param time s
   * @param density filled, d x d row by row, entries in unit_i unit_j / s; arrives filled with zeros
   */
  void noiseDensity(double[] state, double[] control, double time, double[] density);

  /**
   * {@return in which inputs the state after any time is linear once the others are given: those in which the drift is
   * linear, if the drifts of the others do not read them; none unless said otherwise}
   */
  default Structure structure() {
    return Structure.UNKNOWN;
  }
}

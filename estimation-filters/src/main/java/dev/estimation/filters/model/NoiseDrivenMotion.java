package dev.estimation.filters.model;

/**
 * How a state moves when noise enters inside: x(t + dt) = f(x, noise, control, t, dt), noise ~ N(0, Q).
 *
 * <p>Wheel slip, a gust on a commanded speed: noise that is turned and bent with the state. Points are
 * drawn in state and noise together. A model that also has its Jacobians is a {@link
 * DifferentiableNoiseDrivenMotion}. The active and linear inputs of its structure are components of the state,
 * and components of the noise counted on from the dimension of the state.
 */
public non-sealed interface NoiseDrivenMotion extends Motion {
  /** {@return the number of noise components, 1 or more} */
  int noiseDimension();

  /**
   * Fills {@code next} with f(state, noise, control, time, dt).
   *
   * @param state read, never kept
   * @param noise read, never kept
   * @param control read, never kept; holds over the whole of dt
   * @param time at the start (s)
   * @param dt duration (s), above 0
   * @param next filled; arrives filled with NaN, so that a component left out is noticed
   */
  void move(
      double[] state, double[] noise, double[] control, double time, double dt, double[] next);

  /**
   * Fills {@code covariance} with that of the noise over one step, symmetric and positive
   * semi-definite. White noise of spectral density q, held over the step, has variance q / dt.
   *
   * @param control read, never kept
   * @param time at the start (s)
   * @param dt duration (s), above 0
   * @param covariance filled, q x q row by row, q the noise dimension; arrives filled with zeros
   */
  void noiseCovariance(double[] control, double time, double dt, double[] covariance);
}

package dev.estimation.filters.motion;

/**
 * The clock of a receiver: its bias grows by its drift, and both are noisy. State: bias and drift, in s and s/s or,
 * times the speed of light, in m and m/s. Exactly,
 *
 * <pre>
 * F = [1 dt]     Q = [p dt + f dt^3/3  f dt^2/2]
 *     [0  1]         [f dt^2/2         f dt    ]
 * </pre>
 *
 * <p>with p the spectral density of the phase noise and f that of the frequency noise. From the Allan variance of the
 * oscillator, common practice: p = h0 / 2 and f = 2 pi^2 h(-2) in seconds, times the square of the speed of light in
 * metres. Linear in both; Q composes over time. <i>Immutable.</i> Allocates nothing. Source: Brown and Hwang 1997,
 * <i>Introduction to Random Signals and Applied Kalman Filtering</i>, chapter 11 (from memory).
 */
public final class ReceiverClock extends AxisMotion {
  private final double phaseDensity;
  private final double frequencyDensity;

  /**
   * The model.
   *
   * @param phaseDensity spectral density of the noise on the rate of the bias (s, or m^2/s), finite and 0 or more
   * @param frequencyDensity spectral density of the noise on the rate of the drift (1/s, or m^2/s^3), finite and 0
   *     or more
   */
  public ReceiverClock(double phaseDensity, double frequencyDensity) {
    super(new double[] {1}, 2);
    this.phaseDensity = Parameters.notNegative("ReceiverClock phaseDensity", phaseDensity);
    this.frequencyDensity =
        Parameters.notNegative("ReceiverClock frequencyDensity", frequencyDensity);
  }

  @Override
  double transition(int row, int column, double dt) {
    return WhiteNoise.integral(column - row, dt);
  }

  @Override
  double noise(int row, int column, double dt) {
    double frequency = frequencyDensity * WhiteNoise.covariance(1, row, column, dt);
    return column == 0 ? frequency + phaseDensity * dt : frequency;
  }
}

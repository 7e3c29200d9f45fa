package dev.estimation.filters.motion;

/**
 * The functions c_k(t) = 1/k! - t^2/(k + 2)! + t^4/(k + 4)! - ..., of which rotations by the angle t are made: c_0 = cos t,
 * c_1 = sin(t)/t, c_2 = (1 - cos t)/t^2, and so on by c_(k+2) = (1/k! - c_k)/t^2. Source: Stumpff 1959,
 * <i>Himmelsmechanik</i> (from memory).
 */
final class TurnSeries {
  /** Up to this square the series is summed; above it the recurrence loses a digit or two at k = 5. */
  private static final double SERIES = 1;

  private static final int TERMS = 9;

  private TurnSeries() {}

  /**
   * c_k of the square of the angle.
   *
   * @param k 1 or more
   * @param squared t^2, 0 or more
   */
  static double sum(int k, double squared) {
    return squared > SERIES ? recurred(k, squared) : summed(k, squared);
  }

  private static double recurred(int k, double squared) {
    double t = Math.sqrt(squared);
    int order = k % 2;
    double value = order == 0 ? Math.cos(t) : Math.sin(t) / t;
    for (; order < k; order += 2) {
      value = (1 / WhiteNoise.factorial(order) - value) / squared;
    }
    return value;
  }

  /** The first term left out is below 1e-17. */
  private static double summed(int k, double squared) {
    double term = 1 / WhiteNoise.factorial(k);
    double sum = 0;
    for (int n = 0; n < TERMS; n++) {
      sum += term;
      term *= -squared / ((k + 2 * n + 1) * (k + 2 * n + 2));
    }
    return sum;
  }
}

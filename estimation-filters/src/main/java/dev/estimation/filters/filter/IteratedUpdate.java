package dev.estimation.filters.filter;

/**
 * How an iterated first-order update relinearises: the Gauss-Newton method for the most probable state
 * given prior and measurement.
 *
 * <p>From x_0 = m, with H_i the Jacobian at x_i: K_i = P H_i' (H_i P H_i' + R)^-1, x_(i+1) = m + K_i (z -
 * h(x_i) - H_i (m - x_i)). It ends when no component moves by more than the tolerance, in prior
 * standard deviations; H and K once more at the last x give the covariance. R is that at the prior
 * mean. If the rounds run out, the status is {@link StepStatus#NOT_CONVERGED} and nothing changes.
 *
 * <p>Undamped steps converge where the measurement bends little within the posterior; elsewhere they
 * may circle. A line search halves each step until the cost (s's + r' R^-1 r) / 2 falls as far as its
 * slope promises (Armijo's rule, factor 1e-4), with s the state in unit coordinates of the prior and r
 * the residual; it converges to a local maximum of the posterior density.
 *
 * <p><i>Immutable.</i> Source: Bell and Cathey 1993, <i>The iterated Kalman filter update as a
 * Gauss-Newton method</i>, IEEE Transactions on Automatic Control 38(2); line search: Nocedal and
 * Wright 2006, <i>Numerical Optimization</i>, section 3.1 (from memory).
 */
public final class IteratedUpdate {
  private final boolean lineSearch;
  private final double tolerance;
  private final int maximumRounds;

  private IteratedUpdate(boolean lineSearch, double tolerance, int maximumRounds) {
    this.lineSearch = lineSearch;
    this.tolerance = tolerance;
    this.maximumRounds = maximumRounds;
  }

  /** {@return full steps, tolerance 1e-9 standard deviations, at most 50 rounds} */
  public static IteratedUpdate undamped() {
    return new IteratedUpdate(false, 1e-9, 50);
  }

  /** {@return steps with a line search, tolerance 1e-9 standard deviations, at most 500 rounds} */
  public static IteratedUpdate lineSearch() {
    return new IteratedUpdate(true, 1e-9, 500);
  }

  /**
   * The same with another tolerance.
   *
   * @param standardDeviations of the prior, above 0
   * @return the setting
   */
  public IteratedUpdate withTolerance(double standardDeviations) {
    if (!(standardDeviations > 0)) {
      throw new IllegalArgumentException("tolerance must be > 0, got " + standardDeviations);
    }
    return new IteratedUpdate(lineSearch, standardDeviations, maximumRounds);
  }

  /**
   * The same with another limit.
   *
   * @param rounds 1 or more
   * @return the setting
   */
  public IteratedUpdate withMaximumRounds(int rounds) {
    if (rounds < 1) {
      throw new IllegalArgumentException("maximum rounds must be 1 or more, got " + rounds);
    }
    return new IteratedUpdate(lineSearch, tolerance, rounds);
  }

  boolean searchesLine() {
    return lineSearch;
  }

  double tolerance() {
    return tolerance;
  }

  int maximumRounds() {
    return maximumRounds;
  }
}

package dev.estimation.benchmarks.weigh;

/**
 * A method at the operating points of one function.
 *
 * @param method its name
 * @param refusal why it cannot serve the function; empty if it can
 * @param error the largest of the errors of mean, covariance and cross-covariance where they are used, the uncertainty of
 *     the truth included
 * @param shareAbove share of the points whose error is above the tolerance
 * @param evaluations of the function, a call
 * @param jacobians a call
 * @param micros measured time of a call (us); NaN if it was not measured
 * @param failures at how many points it gave no result; errors are infinite there
 * @param firstFailure in words; empty if there was none
 */
public record MethodWeight(
    String method,
    String refusal,
    Quantiles error,
    double shareAbove,
    Quantiles evaluations,
    Quantiles jacobians,
    double micros,
    int failures,
    String firstFailure) {
  /** The share of points at which an error may be above the tolerance. */
  static final double ALLOWED_ABOVE = 0.01;

  /** {@return whether it can serve the function at all} */
  public boolean serves() {
    return refusal.isEmpty();
  }

  /** {@return whether the error is within the tolerance at 99 % of the points or more} */
  public boolean suffices() {
    return serves() && shareAbove <= ALLOWED_ABOVE;
  }

  /** {@return median evaluations and Jacobians of a call} */
  public double cost() {
    return evaluations.median() + jacobians.median();
  }
}

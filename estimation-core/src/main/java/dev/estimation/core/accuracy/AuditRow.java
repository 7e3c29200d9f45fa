package dev.estimation.core.accuracy;

import java.util.Arrays;
import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * One method of an audit. <i>Immutable.</i>
 *
 * @param method its name
 * @param evaluations of the function, the mean over points; those for numerical derivatives included
 * @param jacobians the mean over points; numerical ones included
 * @param mean error of the mean
 * @param covariance error of the covariance, or of U
 * @param crossCovariance error of W
 * @param divergence Kullback-Leibler divergence (nats)
 * @param largest the largest error but the divergence, plus the uncertainty of the reference itself: what a
 *     tolerance is compared with
 * @param neededTolerances that error for each point, in rising order
 * @param failures at how many points the method gave no result; errors are infinite there
 * @param firstFailure the first of them in words; empty if there was none
 */
public record AuditRow(
    String method,
    double evaluations,
    double jacobians,
    ErrorQuantiles mean,
    ErrorQuantiles covariance,
    ErrorQuantiles crossCovariance,
    ErrorQuantiles divergence,
    ErrorQuantiles largest,
    List<Double> neededTolerances,
    int failures,
    String firstFailure) {
  /**
   * A row.
   *
   * @param method name
   * @param evaluations mean over points
   * @param jacobians mean over points
   * @param mean error
   * @param covariance error
   * @param crossCovariance error
   * @param divergence in nats
   * @param largest error, the reference's uncertainty included
   * @param neededTolerances copied
   * @param failures how many
   * @param firstFailure in words
   */
  public AuditRow {
    neededTolerances = List.copyOf(neededTolerances);
  }

  static AuditRow of(
      String method,
      double evaluations,
      double jacobians,
      List<MatchingError> errors,
      double[] uncertainties,
      int failures,
      String firstFailure) {
    double[] neededTolerances = values(errors, MatchingError::largest);
    for (int i = 0; i < neededTolerances.length; i++) {
      neededTolerances[i] += uncertainties[i];
    }
    return new AuditRow(
        method,
        evaluations,
        jacobians,
        ErrorQuantiles.of(values(errors, MatchingError::mean)),
        ErrorQuantiles.of(values(errors, MatchingError::covariance)),
        ErrorQuantiles.of(values(errors, MatchingError::crossCovariance)),
        ErrorQuantiles.of(values(errors, MatchingError::divergence)),
        ErrorQuantiles.of(neededTolerances),
        Arrays.stream(neededTolerances).sorted().boxed().toList(),
        failures,
        firstFailure);
  }

  private static double[] values(
      List<MatchingError> errors, ToDoubleFunction<MatchingError> which) {
    return errors.stream().mapToDouble(which).toArray();
  }

  /**
   * {@return the share of points at which the method is within a tolerance}
   *
   * @param tolerance of the largest error but the divergence, the reference's uncertainty included
   */
  public double shareWithin(double tolerance) {
    return neededTolerances.stream().filter(error -> error <= tolerance).count()
        / (double) neededTolerances.size();
  }
}

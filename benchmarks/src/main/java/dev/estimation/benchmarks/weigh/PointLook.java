package dev.estimation.benchmarks.weigh;

import java.util.List;

/**
 * What was seen at one operating point.
 *
 * @param unknown why there is no truth, for instance that the function gives NaN; empty if there is
 * @param uncertainty of the truth, in the scale of errors
 * @param converged whether rules of growing order agree on the truth
 * @param nonlinearInputs how many inputs points are drawn over
 * @param methods one for each contender; empty if there is no truth
 */
record PointLook(
    String unknown,
    double uncertainty,
    boolean converged,
    int nonlinearInputs,
    List<MethodLook> methods) {

  /**
   * What a contender did.
   *
   * @param error the largest error of mean, covariance and cross-covariance, the truth's uncertainty included;
   *     infinite if it gave no result
   * @param evaluations of the function
   * @param jacobians formed
   * @param refused whether it cannot serve the function at all
   * @param failure in words; empty if there was none
   */
  record MethodLook(
      double error, int evaluations, int jacobians, boolean refused, String failure) {}

  static PointLook unknown(String reason) {
    return new PointLook(reason, Double.NaN, false, 0, List.of());
  }

  boolean isKnown() {
    return unknown.isEmpty();
  }
}

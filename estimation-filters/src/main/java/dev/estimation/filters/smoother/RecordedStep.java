package dev.estimation.filters.smoother;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.filters.filter.Estimate;
import org.ejml.data.DMatrixRMaj;

/**
 * A filtered estimate, and the prediction that led to it; the first step has none. The way back goes by the
 * conditional if there is one, else by the predicted covariance and the cross-covariance.
 */
final class RecordedStep {
  private final double time;
  private final Moments filtered;
  private final double[] predictedMean;
  private final DMatrixRMaj predicted;
  private final DMatrixRMaj cross;
  private final Conditional conditional;

  private RecordedStep(
      Estimate estimate,
      double[] predictedMean,
      DMatrixRMaj predicted,
      DMatrixRMaj cross,
      Conditional conditional) {
    this.time = estimate.time();
    this.filtered = new Moments(estimate.space());
    estimate.copyInto(filtered);
    this.predictedMean = predictedMean;
    this.predicted = predicted;
    this.cross = cross;
    this.conditional = conditional;
  }

  static RecordedStep first(Estimate estimate) {
    return new RecordedStep(estimate, null, null, null, null);
  }

  static RecordedStep after(Moments prediction, DMatrixRMaj cross, Estimate estimate) {
    DMatrixRMaj covariance = prediction.covariance().copy();
    return new RecordedStep(estimate, prediction.mean().clone(), covariance, cross, null);
  }

  static RecordedStep after(Moments prediction, Conditional conditional, Estimate estimate) {
    return new RecordedStep(estimate, prediction.mean().clone(), null, null, conditional);
  }

  /** The same prediction, with the estimate after further updates. */
  RecordedStep updated(Estimate estimate) {
    return new RecordedStep(estimate, predictedMean, predicted, cross, conditional);
  }

  double time() {
    return time;
  }

  Moments filtered() {
    return filtered;
  }

  double[] predictedMean() {
    return predictedMean;
  }

  /** P', or null if there is a conditional. */
  DMatrixRMaj predicted() {
    return predicted;
  }

  /** C, or null if there is a conditional. */
  DMatrixRMaj cross() {
    return cross;
  }

  /** The state given the next, or null. */
  Conditional conditional() {
    return conditional;
  }
}

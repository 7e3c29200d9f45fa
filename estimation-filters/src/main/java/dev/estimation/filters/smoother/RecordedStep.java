package dev.estimation.filters.smoother;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.filters.filter.Estimate;
import org.ejml.data.DMatrixRMaj;

/** A filtered estimate, and the prediction that led to it; the first step has none. */
record RecordedStep(double time, Gaussian filtered, Moments predicted, DMatrixRMaj cross) {

  static RecordedStep first(Estimate estimate) {
    return new RecordedStep(estimate.time(), estimate.toGaussian(), null, null);
  }

  static RecordedStep after(Moments prediction, DMatrixRMaj cross, Estimate estimate) {
    Moments copy = new Moments(prediction.space());
    copy.set(prediction);
    return new RecordedStep(estimate.time(), estimate.toGaussian(), copy, cross);
  }

  /** The same prediction, with the estimate after further updates. */
  RecordedStep updated(Estimate estimate) {
    return new RecordedStep(time, estimate.toGaussian(), predicted, cross);
  }
}

package dev.estimation.filters.soak;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;

/** One filter on one model, step by step. */
final class SoakTrack {
  private final FilterPlan plan;
  private final Gaussian prior;
  private final FilterWorkspace work;
  private final SensorPort port;
  private final Moments copy;
  private Estimate estimate;
  private StepStatus status = StepStatus.APPLIED;

  SoakTrack(FilterPlan plan, SoakModel model, Gaussian prior) {
    this.plan = plan;
    this.prior = prior;
    this.work = plan.workspace();
    this.port = work.port(model.sensor());
    this.estimate = plan.start(0, prior);
    this.copy = new Moments(estimate.space());
  }

  /** A prediction and an update; the first status that is not APPLIED, in words, or none. */
  String step(double time, double[] z) {
    status = work.predict(estimate, time);
    if (status != StepStatus.APPLIED) {
      return status + ": " + work.failure();
    }
    status = port.update(estimate, z);
    return status == StepStatus.APPLIED ? "" : status + ": " + port.failure();
  }

  boolean succeeded() {
    return status == StepStatus.APPLIED;
  }

  void restart(double time) {
    estimate = plan.start(time, prior);
  }

  void follow(SoakTrack other, double time) {
    estimate = plan.start(time, other.estimate.toGaussian());
  }

  /** Whether mean and covariance are finite and the matrix, factored anew, is positive semi-definite. */
  boolean isSound() {
    estimate.copyInto(copy);
    copy.covariance();
    copy.changeCovariance();
    for (double value : copy.mean()) {
      if (!Double.isFinite(value)) {
        return false;
      }
    }
    return copy.factor();
  }

  /** The largest difference, in standard deviations and products of them; NaN wins. */
  double distance(SoakTrack other) {
    int n = estimate.space().dimension();
    double largest = 0;
    for (int i = 0; i < n; i++) {
      double deviation = estimate.standardDeviation(i);
      double apart = estimate.mean(i) - other.estimate.mean(i);
      largest = Math.max(largest, Math.abs(apart / deviation));
      for (int j = 0; j <= i; j++) {
        double entry = estimate.covariance(i, j) - other.estimate.covariance(i, j);
        double scale = deviation * estimate.standardDeviation(j);
        largest = Math.max(largest, Math.abs(entry / scale));
      }
    }
    return largest;
  }
}

package dev.estimation.benchmarks.jmh;

import dev.estimation.core.accuracy.CarriedMoments;
import dev.estimation.core.accuracy.MatchingError;
import dev.estimation.core.accuracy.ReferenceMoments;
import dev.estimation.core.accuracy.ReferenceSearch;
import dev.estimation.core.accuracy.ReferenceSettings;
import dev.estimation.core.matching.MatchingWorkspace;

/**
 * How accurate a matching is at a problem, and what it called for that.
 *
 * @param mean error of the mean against converged moments, as {@link MatchingError} has it
 * @param covariance of the covariance where it is used
 * @param uncertainty the estimated error of the converged moments themselves; smaller errors are not told apart
 * @param evaluations of the function
 * @param jacobians of the function
 */
record CarryAccuracy(
    double mean, double covariance, double uncertainty, int evaluations, int jacobians) {

  /** The truth of one problem, found once. */
  static final class Truth {
    private final CarryProblem problem;
    private final CarriedMoments moments;
    private final double uncertainty;

    Truth(CarryProblem problem) {
      this.problem = problem;
      ReferenceSearch search = new ReferenceSearch(
          ReferenceSettings.standard(), problem.input(), problem.output(), problem.exact());
      ReferenceMoments found = search.find(problem.point(), problem.use());
      this.moments = found.moments().plusNoise(problem.point().noise());
      this.uncertainty = found.estimatedError();
    }

    CarryAccuracy of(ComparedMatching matching) {
      Carrier carrier = new Carrier(problem, matching);
      MatchingWorkspace work = carrier.work();
      MatchingError error =
          MatchingError.of(moments, CarriedMoments.of(work, carrier.input()), problem.use());
      return new CarryAccuracy(
          error.mean(), error.covariance(), uncertainty, work.evaluations(), work.jacobians());
    }
  }

  /** {@return the larger of the two errors, or the uncertainty if it is larger still} */
  double error() {
    return Math.max(uncertainty, Math.max(mean, covariance));
  }
}

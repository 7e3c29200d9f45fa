package dev.estimation.benchmarks.page;

import dev.estimation.core.accuracy.CarriedMoments;
import dev.estimation.core.accuracy.MatchingError;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.SpreadLinearisation;
import dev.estimation.core.points.QuasiRandomRule;

/**
 * How wrong linearisation is at a place: the largest of the errors of {@link MatchingError} against 512 quasi-random points.
 * A model without a Jacobian is linearised by differences over the spread.
 */
final class Bend {
  private static final MomentMatching MANY =
      PointMatching.of(QuasiRandomRule.sobol(512).standardised());

  private Bend() {}

  /** {@return the error; NaN if there is nothing to measure it by} */
  static double at(CloudPoint point) {
    try {
      CarriedMoments linear = carried(point, linear(point));
      CarriedMoments sampled =
          carried(point, MANY.workspace(point.input(), point.output(), point.function()));
      return linear == null || sampled == null
          ? Double.NaN
          : MatchingError.of(sampled, linear, point.use()).largest();
    } catch (IllegalArgumentException noScale) {
      return Double.NaN;
    }
  }

  private static MatchingWorkspace linear(CloudPoint point) {
    try {
      return Linearisation.firstOrder().workspace(point.input(), point.output(), point.function());
    } catch (IllegalArgumentException noJacobian) {
      return SpreadLinearisation.firstOrder()
          .workspace(point.input(), point.output(), point.function());
    }
  }

  private static CarriedMoments carried(CloudPoint point, MatchingWorkspace work) {
    Moments prior = new Moments(point.input());
    prior.set(point.prior());
    return work.carry(prior, point.given(), null, point.use()) == MatchingStatus.MATCHED
        ? CarriedMoments.of(work, prior).plusNoise(point.noise())
        : null;
  }
}

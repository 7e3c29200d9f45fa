package dev.estimation.benchmarks.weigh;

import dev.estimation.benchmarks.weigh.PointLook.MethodLook;
import dev.estimation.core.accuracy.CarriedMoments;
import dev.estimation.core.accuracy.MatchingError;
import dev.estimation.core.accuracy.OperatingPoint;
import dev.estimation.core.accuracy.ReferenceMoments;
import dev.estimation.core.accuracy.ReferenceSearch;
import dev.estimation.core.accuracy.ReferenceSettings;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.Use;
import java.util.ArrayList;
import java.util.List;

/** Holds all contenders against the truth, point by point, for one function. <i>Confined to one thread.</i> */
final class Examiner {
  private final ReferenceSearch search;
  private final List<Contender.Scratch> contenders;
  private final Moments moments;
  private final Covariance noise;
  private final int nonlinearInputs;

  Examiner(Carry.Target target, List<Contender> contenders, ReferenceSettings settings) {
    this.search = new ReferenceSearch(settings, target.input(), target.output(), target.function());
    this.contenders = contenders.stream().map(one -> one.scratch(target)).toList();
    this.moments = new Moments(target.input());
    this.noise = new Covariance(target.output().dimension());
    this.nonlinearInputs = target.nonlinearInputs();
  }

  PointLook look(Carry carry) {
    try {
      OperatingPoint point = carry.point();
      return compare(point, carry.use(), search.find(point, carry.use()));
    } catch (IllegalArgumentException noTruth) {
      return PointLook.unknown(noTruth.getMessage());
    }
  }

  private PointLook compare(OperatingPoint point, Use use, ReferenceMoments reference) {
    CarriedMoments truth = reference.moments().plusNoise(point.noise());
    moments.set(point.input());
    noise.changeMatrix().setTo(point.noise());
    List<MethodLook> looks = new ArrayList<>();
    for (Contender.Scratch contender : contenders) {
      looks.add(
          contender.work() == null
              ? new MethodLook(Double.POSITIVE_INFINITY, 0, 0, true, contender.refusal())
              : look(contender.work(), point, use, truth, reference.estimatedError()));
    }
    return new PointLook(
        "",
        reference.estimatedError(),
        reference.evidence() == ReferenceMoments.Evidence.CONVERGED_LEVELS,
        nonlinearInputs,
        looks);
  }

  /** Moments that a matching knows to be below its tolerance are moments all the same, and measured. */
  private MethodLook look(
      MatchingWorkspace work,
      OperatingPoint point,
      Use use,
      CarriedMoments truth,
      double uncertainty) {
    MatchingStatus status = work.carry(moments, point.given(), noise, use);
    boolean matched = status.hasResult();
    double error = matched
        ? MatchingError.of(truth, CarriedMoments.of(work, moments), use).largest() + uncertainty
        : Double.POSITIVE_INFINITY;
    return new MethodLook(
        error, work.evaluations(), work.jacobians(), false, matched ? "" : work.failure());
  }
}

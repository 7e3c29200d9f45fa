package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.filters.model.MotionModel;

/** Noise is added after the motion. */
final class AdditiveTransition extends Transition {
  private final MotionModel model;
  private final MotionFunction function;

  AdditiveTransition(MotionModel model, FilterPlan plan) {
    this(model, new MotionFunction(model), plan);
  }

  private AdditiveTransition(MotionModel model, MotionFunction function, FilterPlan plan) {
    super(
        FilterPlan.nameOf(model),
        model.controlDimension(),
        new NoiseMatrix("processNoise", model.stateSpace().dimension(), false),
        plan.workspace(
            model.stateSpace(),
            model.stateSpace(),
            function,
            "motion model " + FilterPlan.nameOf(model)
                + "; its derivatives: DifferentiableMotion, TwiceDifferentiableMotion"));
    this.model = model;
    this.function = function;
  }

  @Override
  void fillNoise(double[] mean, double[] control, double time, double dt, double[] covariance) {
    model.processNoise(mean, control, time, dt, covariance);
  }

  @Override
  MatchingStatus match(
      Moments prior,
      double[] control,
      double time,
      double dt,
      Covariance noiseCovariance,
      MatchingWorkspace workspace) {
    function.over(time, dt);
    return workspace.carry(prior, control, noiseCovariance);
  }
}

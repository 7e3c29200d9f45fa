package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.NoiseDrivenMotion;
import org.ejml.data.DMatrixRMaj;

/** Noise enters inside the motion: state and noise are carried together. */
final class NoiseDrivenTransition extends Transition {
  private final NoiseDrivenMotion model;
  private final NoiseDrivenFunction function;
  private final Moments joint;
  private final Form form;

  NoiseDrivenTransition(NoiseDrivenMotion model, FilterPlan plan) {
    this(
        model,
        new NoiseDrivenFunction(model),
        model.stateSpace().and(Space.reals(model.noiseDimension())),
        plan);
  }

  private NoiseDrivenTransition(
      NoiseDrivenMotion model, NoiseDrivenFunction function, Space space, FilterPlan plan) {
    super(
        FilterPlan.nameOf(model),
        model.controlDimension(),
        new NoiseMatrix("noiseCovariance", model.noiseDimension(), false),
        plan.workspace(
            space,
            model.stateSpace(),
            function,
            "motion model " + FilterPlan.nameOf(model)
                + "; its Jacobians: DifferentiableNoiseDrivenMotion"));
    this.model = model;
    this.function = function;
    this.joint = new Moments(space);
    this.form = plan.form();
  }

  @Override
  void fillNoise(double[] mean, double[] control, double time, double dt, double[] covariance) {
    model.noiseCovariance(control, time, dt, covariance);
  }

  @Override
  MatchingStatus match(
      Moments prior,
      double[] control,
      double time,
      double dt,
      Covariance noiseCovariance,
      MatchingWorkspace workspace) {
    if (!prior.factor()) {
      return MatchingStatus.INPUT_NOT_DEFINITE;
    }
    join(prior, noiseCovariance);
    function.over(time, dt);
    return workspace.carry(joint, control, null);
  }

  /** Mean (x, 0), covariance diag(P, Q), or the factors so; other entries are zero since the joint was made. */
  private void join(Moments prior, Covariance noise) {
    System.arraycopy(prior.mean(), 0, joint.changeMean(), 0, prior.mean().length);
    int d = prior.space().dimension();
    if (form == Form.COVARIANCE) {
      copyBlock(prior.covariance(), joint.changeCovariance(), 0);
      copyBlock(noise.matrix(), joint.changeCovariance(), d);
    } else {
      copyBlock(prior.lowerFactor(), joint.changeFactor(), 0);
      copyBlock(noise.lowerFactor(), joint.changeFactor(), d);
    }
  }

  private static void copyBlock(DMatrixRMaj block, DMatrixRMaj target, int corner) {
    int n = block.numRows;
    for (int r = 0; r < n; r++) {
      int start = (corner + r) * target.numCols + corner;
      System.arraycopy(block.data, r * n, target.data, start, n);
    }
  }
}

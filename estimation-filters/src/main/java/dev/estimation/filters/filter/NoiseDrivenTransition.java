package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.model.NoiseDrivenMotion;
import org.ejml.data.DMatrixRMaj;

/** Noise enters inside the motion: state and noise are carried together. */
final class NoiseDrivenTransition extends Transition {
  private final NoiseDrivenMotion model;
  private final NoiseDrivenFunction function;
  private final Moments joint;

  NoiseDrivenTransition(NoiseDrivenMotion model, MomentMatching matching) {
    this(
        model,
        new NoiseDrivenFunction(model),
        new AppendedReals(model.stateSpace(), model.noiseDimension()),
        matching);
  }

  private NoiseDrivenTransition(
      NoiseDrivenMotion model,
      NoiseDrivenFunction function,
      AppendedReals space,
      MomentMatching matching) {
    super(
        FilterPlan.nameOf(model),
        model.controlDimension(),
        new NoiseMatrix("noiseCovariance", model.noiseDimension(), false),
        FilterPlan.workspace(
            matching,
            space,
            model.stateSpace(),
            function,
            "motion model " + FilterPlan.nameOf(model)
                + "; its Jacobians: DifferentiableNoiseDrivenMotion"));
    this.model = model;
    this.function = function;
    this.joint = new Moments(space);
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
      DMatrixRMaj noiseCovariance,
      MatchingWorkspace workspace) {
    join(prior, noiseCovariance);
    function.over(time, dt);
    return workspace.carry(joint, control, null);
  }

  /** Mean (x, 0), covariance diag(P, Q); the other entries are zero since the joint was made. */
  private void join(Moments prior, DMatrixRMaj noiseCovariance) {
    System.arraycopy(prior.mean(), 0, joint.changeMean(), 0, prior.mean().length);
    DMatrixRMaj covariance = joint.changeCovariance();
    copyBlock(prior.covariance(), covariance, 0);
    copyBlock(noiseCovariance, covariance, prior.covariance().numRows);
  }

  private static void copyBlock(DMatrixRMaj block, DMatrixRMaj target, int corner) {
    int n = block.numRows;
    for (int r = 0; r < n; r++) {
      int start = (corner + r) * target.numCols + corner;
      System.arraycopy(block.data, r * n, target.data, start, n);
    }
  }
}

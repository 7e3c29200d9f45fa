package dev.estimation.filters.filter;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.NoiseDrivenMotion;
import java.util.Arrays;

/** A noise-driven motion over a set time, as a function of (state, noise). Owned by one workspace. */
final class NoiseDrivenFunction implements VectorFunction {
  private final NoiseDrivenMotion model;
  private final double[] state;
  private final double[] noise;
  private final double[] byState;
  private final double[] byNoise;
  private double time;
  private double dt;

  NoiseDrivenFunction(NoiseDrivenMotion model) {
    this.model = model;
    if (model.noiseDimension() < 1) {
      throw new IllegalArgumentException("noise dimension must be 1 or more, got "
          + model.noiseDimension() + " (motion model " + FilterPlan.nameOf(model) + ")");
    }
    int d = model.stateSpace().dimension();
    this.state = new double[model.stateSpace().storage()];
    this.noise = new double[model.noiseDimension()];
    this.byState = new double[d * d];
    this.byNoise = new double[d * noise.length];
  }

  void over(double start, double duration) {
    time = start;
    dt = duration;
  }

  @Override
  public void evaluate(double[] joint, double[] control, double[] next) {
    split(joint);
    model.move(state, noise, control, time, dt, next);
  }

  private void split(double[] joint) {
    System.arraycopy(joint, 0, state, 0, state.length);
    System.arraycopy(joint, state.length, noise, 0, noise.length);
  }

  @Override
  public Structure structure() {
    if (model instanceof DifferentiableNoiseDrivenMotion differentiable) {
      return model
          .structure()
          .withJacobian(
              (joint, control, all) -> differentiate(differentiable, joint, control, all));
    }
    return model.structure();
  }

  private void differentiate(
      DifferentiableNoiseDrivenMotion differentiable,
      double[] joint,
      double[] control,
      double[] jacobian) {
    split(joint);
    Arrays.fill(byState, 0);
    Arrays.fill(byNoise, 0);
    differentiable.moveJacobians(state, noise, control, time, dt, byState, byNoise);
    int q = noise.length;
    int d = byNoise.length / q;
    for (int r = 0; r < d; r++) {
      System.arraycopy(byState, r * d, jacobian, r * (d + q), d);
      System.arraycopy(byNoise, r * q, jacobian, r * (d + q) + d, q);
    }
  }
}

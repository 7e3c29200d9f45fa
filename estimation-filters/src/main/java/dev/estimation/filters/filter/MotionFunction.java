package dev.estimation.filters.filter;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.TwiceDifferentiableMotion;

/** A motion model over a set time: given is the control. Owned by one workspace. */
final class MotionFunction implements VectorFunction {
  private final MotionModel model;
  private double time;
  private double dt;

  MotionFunction(MotionModel model) {
    this.model = model;
  }

  void over(double start, double duration) {
    time = start;
    dt = duration;
  }

  @Override
  public void evaluate(double[] state, double[] control, double[] next) {
    model.move(state, control, time, dt, next);
  }

  @Override
  public Structure structure() {
    Structure structure = model.structure();
    if (model instanceof DifferentiableMotion once) {
      structure = structure.withJacobian(
          (state, control, jacobian) -> once.moveJacobian(state, control, time, dt, jacobian));
    }
    if (model instanceof TwiceDifferentiableMotion twice) {
      structure = structure.withHessian(
          (state, control, hessians) -> twice.moveHessian(state, control, time, dt, hessians));
    }
    return structure;
  }
}

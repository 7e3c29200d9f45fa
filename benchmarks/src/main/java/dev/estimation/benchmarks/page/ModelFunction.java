package dev.estimation.benchmarks.page;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/** Models as functions of the state, with what they tell of themselves. */
final class ModelFunction {
  private ModelFunction() {}

  static VectorFunction of(SensorModel sensor) {
    Structure structure = sensor.structure();
    if (sensor instanceof DifferentiableSensor once) {
      structure = structure.withJacobian(once::measureJacobian);
    }
    if (sensor instanceof TwiceDifferentiableSensor twice) {
      structure = structure.withHessian(twice::measureHessian);
    }
    return new Told(sensor::measure, structure);
  }

  /** A motion over a given time. */
  static VectorFunction of(MotionModel motion, double time, double dt) {
    Structure structure = motion.structure();
    if (motion instanceof DifferentiableMotion once) {
      structure = structure.withJacobian(
          (x, control, jacobian) -> once.moveJacobian(x, control, time, dt, jacobian));
    }
    if (motion instanceof TwiceDifferentiableMotion twice) {
      structure = structure.withHessian(
          (x, control, hessian) -> twice.moveHessian(x, control, time, dt, hessian));
    }
    return new Told((x, control, next) -> motion.move(x, control, time, dt, next), structure);
  }

  /** A function and its structure. */
  private record Told(VectorFunction function, Structure structure) implements VectorFunction {
    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      function.evaluate(input, given, output);
    }
  }
}

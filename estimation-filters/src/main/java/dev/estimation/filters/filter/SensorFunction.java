package dev.estimation.filters.filter;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/** A sensor model as a function of the state. */
final class SensorFunction implements VectorFunction {
  private final SensorModel model;

  SensorFunction(SensorModel model) {
    this.model = model;
  }

  @Override
  public void evaluate(double[] state, double[] given, double[] measurement) {
    model.measure(state, given, measurement);
  }

  @Override
  public Structure structure() {
    Structure structure = model.structure();
    if (model instanceof DifferentiableSensor once) {
      structure = structure.withJacobian(once::measureJacobian);
    }
    if (model instanceof TwiceDifferentiableSensor twice) {
      structure = structure.withHessian(twice::measureHessian);
    }
    return structure;
  }
}

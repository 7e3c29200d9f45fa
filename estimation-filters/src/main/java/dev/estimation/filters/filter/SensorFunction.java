package dev.estimation.filters.filter;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.SensorModel;

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
    if (model instanceof DifferentiableSensor differentiable) {
      return model.structure().withJacobian(differentiable::measureJacobian);
    }
    return model.structure();
  }
}

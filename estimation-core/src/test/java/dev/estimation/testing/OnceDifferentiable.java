package dev.estimation.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** A function whose Hessian is hidden. */
public record OnceDifferentiable(VectorFunction function) implements VectorFunction {
  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    function.evaluate(input, given, output);
  }

  @Override
  public Structure structure() {
    return function.structure().withHessian(null);
  }
}

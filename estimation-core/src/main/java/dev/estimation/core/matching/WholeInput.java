package dev.estimation.core.matching;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** A function that is said to read all of its input; its Jacobian is kept. */
final class WholeInput implements VectorFunction {
  private final VectorFunction function;

  WholeInput(VectorFunction function) {
    this.function = function;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    function.evaluate(input, given, output);
  }

  @Override
  public Structure structure() {
    return function.structure().withAllInputsActive();
  }
}

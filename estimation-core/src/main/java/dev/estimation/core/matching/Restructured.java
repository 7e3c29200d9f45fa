package dev.estimation.core.matching;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** A function of which something else is said. */
final class Restructured implements VectorFunction {
  private final VectorFunction function;
  private final Structure structure;

  Restructured(VectorFunction function, Structure structure) {
    this.function = function;
    this.structure = structure;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    function.evaluate(input, given, output);
  }

  @Override
  public Structure structure() {
    return structure;
  }
}

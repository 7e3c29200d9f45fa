package dev.estimation.testing;

import dev.estimation.core.function.VectorFunction;

/** A function of which nothing but its values is known: the Jacobian of another is hidden. */
public final class PlainFunction implements VectorFunction {
  private final VectorFunction function;

  /** Hides what is known of a function. */
  public PlainFunction(VectorFunction function) {
    this.function = function;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    function.evaluate(input, given, output);
  }
}

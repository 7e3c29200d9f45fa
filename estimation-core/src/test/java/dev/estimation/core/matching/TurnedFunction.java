package dev.estimation.core.matching;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Angle;

/** A function whose outputs are turned by an angle and wrapped, as a bearing comes out of atan2. */
final class TurnedFunction implements VectorFunction {
  private final VectorFunction function;
  private final double turn;

  TurnedFunction(VectorFunction function, double turn) {
    this.function = function;
    this.turn = turn;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    function.evaluate(input, given, output);
    for (int i = 0; i < output.length; i++) {
      output[i] = Angle.wrap(output[i] + turn);
    }
  }

  @Override
  public Structure structure() {
    return function.structure();
  }
}

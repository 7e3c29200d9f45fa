package dev.estimation.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/**
 * A function of k inputs that reads them from places in a longer vector: input j of the inner
 * function is component {@code places[j]}. It declares these active inputs and keeps the Jacobian.
 */
public final class EmbeddedFunction implements VectorFunction {
  private final VectorFunction inner;
  private final int outputs;
  private final int dimension;
  private final int[] places;

  /** The inner function, its number of outputs, the length of the vector, and where it reads. */
  public EmbeddedFunction(VectorFunction inner, int outputs, int dimension, int... places) {
    this.inner = inner;
    this.outputs = outputs;
    this.dimension = dimension;
    this.places = places;
  }

  private double[] read(double[] input) {
    double[] values = new double[places.length];
    for (int j = 0; j < places.length; j++) {
      values[j] = input[places[j]];
    }
    return values;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    inner.evaluate(read(input), given, output);
  }

  @Override
  public Structure structure() {
    Structure known = Structure.UNKNOWN.withActiveInputs(places);
    return inner
        .structure()
        .jacobian()
        .map(jacobian -> known.withJacobian((u, given, all) -> scatter(u, given, all)))
        .orElse(known);
  }

  private void scatter(double[] input, double[] given, double[] jacobian) {
    double[] small = new double[outputs * places.length];
    inner.structure().jacobian().orElseThrow().evaluate(read(input), given, small);
    for (int r = 0; r < outputs; r++) {
      for (int j = 0; j < places.length; j++) {
        jacobian[r * dimension + places[j]] = small[r * places.length + j];
      }
    }
  }
}

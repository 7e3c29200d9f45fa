package dev.estimation.testing;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/**
 * A function of k inputs that reads them from places in a longer vector: input j of the inner
 * function is component {@code places[j]}. It declares these active inputs and keeps the derivatives.
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
    Structure known = inner.structure();
    Structure result = Structure.UNKNOWN.withActiveInputs(places);
    if (known.jacobian().isPresent()) {
      result = result.withJacobian(this::scatter);
    }
    return known.hessian().isPresent() ? result.withHessian(this::scatterHessians) : result;
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

  private void scatterHessians(double[] input, double[] given, double[] hessians) {
    int k = places.length;
    double[] small = new double[outputs * k * k];
    inner.structure().hessian().orElseThrow().evaluate(read(input), given, small);
    for (int r = 0; r < outputs; r++) {
      for (int j = 0; j < k; j++) {
        for (int l = 0; l <= j; l++) {
          int row = Math.max(places[j], places[l]);
          int column = Math.min(places[j], places[l]);
          hessians[(r * dimension + row) * dimension + column] = small[(r * k + j) * k + l];
        }
      }
    }
  }
}

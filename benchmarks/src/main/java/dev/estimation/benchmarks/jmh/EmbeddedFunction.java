package dev.estimation.benchmarks.jmh;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import java.util.Arrays;

/** A small function of the first inputs of a larger state, which it names as its active inputs. Has a Jacobian. */
final class EmbeddedFunction implements VectorFunction {
  private final SmallFunction inner;
  private final int dimension;
  private final Structure structure;

  /**
   * The function.
   *
   * @param dimension of the state, at least the inputs of the inner function
   * @param tellsLinearInputs whether it says in which inputs it is linear
   */
  EmbeddedFunction(SmallFunction inner, int dimension, boolean tellsLinearInputs) {
    this.inner = inner;
    this.dimension = dimension;
    int[] active = new int[inner.inputs()];
    Arrays.setAll(active, i -> i);
    Structure known = Structure.UNKNOWN.withActiveInputs(active).withJacobian(this::fillJacobian);
    this.structure = tellsLinearInputs ? known.withLinearInputs(inner.linearInputs()) : known;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    inner.fill(input, output);
  }

  @Override
  public Structure structure() {
    return structure;
  }

  /** Formed with short rows; the last is the first to be moved to its place. */
  private void fillJacobian(double[] input, double[] given, double[] jacobian) {
    inner.fillJacobian(input, jacobian);
    int k = inner.inputs();
    if (k == dimension) {
      return;
    }
    for (int row = inner.outputs() - 1; row > 0; row--) {
      for (int column = k - 1; column >= 0; column--) {
        double value = jacobian[row * k + column];
        jacobian[row * k + column] = 0;
        jacobian[row * dimension + column] = value;
      }
    }
  }
}

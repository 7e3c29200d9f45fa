package dev.estimation.core.matching;

import dev.estimation.core.function.Jacobian;
import dev.estimation.core.internal.Checks;
import java.util.Arrays;

/**
 * Holds the slopes of an expansion at the centre against a Jacobian there. Three nodes take a cubic for something linear;
 * its slope at the centre gives it away. <i>Confined to one thread</i>; allocates only when built.
 */
final class SlopeCheck {
  private final NestedExpansion expansion;
  private final int axes;
  private final int rows;
  private final int columns;
  private final int stride;
  private final ActiveFactor factor;
  private final int[] inputs;
  private final double[] jacobian;
  private final double[] wanted;
  private final double[] values;
  private final double[] slopes;
  private final double[] polynomials;
  private final double[] unused;
  private boolean known;

  /** A check of the axes, the first columns of a factor, in blocks of rows x columns. */
  SlopeCheck(NestedExpansion expansion, int axes, int rows, int columns, ActiveFactor factor) {
    this.expansion = expansion;
    this.axes = axes;
    this.rows = rows;
    this.columns = columns;
    this.factor = factor;
    this.inputs = factor.inputs();
    NestedProjection projection = expansion.projection();
    this.stride = projection.degree(projection.levels() - 1) + 1;
    this.jacobian = new double[rows * factor.factor().numCols];
    this.wanted = new double[axes * rows];
    this.values = new double[stride];
    this.slopes = new double[stride];
    this.polynomials = new double[axes * stride];
    this.unused = new double[axes * rows * columns];
    NestedProjection.fillPolynomials(0, values, 0, stride);
    for (int j = 1; j < stride; j++) {
      slopes[j] = Math.sqrt(j) * values[j - 1];
    }
    for (int axis = 0; axis < axes; axis++) {
      System.arraycopy(values, 0, polynomials, axis * stride, stride);
    }
  }

  /** Whether there is something to compare with. */
  boolean isKnown() {
    return known;
  }

  /** There is no Jacobian. */
  void forget() {
    known = false;
  }

  /** Evaluates a Jacobian at the mean. */
  void evaluate(Jacobian function, double[] mean, double[] given) {
    Arrays.fill(jacobian, 0);
    function.evaluate(mean, given, jacobian);
    take(jacobian);
  }

  /** Takes a Jacobian at the mean, over all inputs; one that is not finite is left aside. */
  void take(double[] derivatives) {
    known = Checks.allFinite(derivatives);
    int n = factor.factor().numCols;
    for (int axis = 0; axis < axes; axis++) {
      for (int row = 0; row < rows; row++) {
        double sum = 0;
        for (int input : inputs) {
          sum += derivatives[row * n + input] * factor.factor().data[input * n + axis];
        }
        wanted[axis * rows + row] = sum;
      }
    }
  }

  /** Fills what the expansion misses of the slopes, a block for each axis. */
  void compare(double[] missed) {
    int width = rows * columns;
    Arrays.fill(missed, 0);
    for (int axis = 0; axis < axes; axis++) {
      int start = axis * width;
      System.arraycopy(slopes, 0, polynomials, axis * stride, stride);
      expansion.addAt(polynomials, 0, stride, unused, missed, start);
      System.arraycopy(values, 0, polynomials, axis * stride, stride);
      for (int at = 0; at < width; at++) {
        // Of the slopes by linear inputs nothing more is known.
        missed[start + at] =
            at % columns == 0 ? wanted[axis * rows + at / columns] - missed[start + at] : 0;
      }
    }
  }
}

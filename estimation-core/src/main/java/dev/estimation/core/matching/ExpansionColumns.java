package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.internal.Householder;
import java.util.Arrays;

/**
 * An expansion as columns: W, then a root of what regression leaves, found by orthogonal reduction of all terms of degree 2
 * and more. <i>Confined to one thread</i>; allocates only when built.
 */
final class ExpansionColumns {
  private static final int CHUNK = 16;

  private final NestedExpansion expansion;
  private final int axes;
  private final int rows;
  private final int columns;
  private final WeightedColumns total;
  private final WeightedColumns left;
  private final double[] root;
  private final double[] chunk;
  private int filled;

  ExpansionColumns(NestedExpansion expansion, int axes, int rows, int columns, Form form) {
    this.expansion = expansion;
    this.axes = axes;
    this.rows = rows;
    this.columns = columns;
    double[] weights = new double[explained() + rows];
    Arrays.fill(weights, 1);
    this.total = new WeightedColumns(rows, weights, form);
    this.left = new WeightedColumns(rows, Arrays.copyOf(weights, rows), form);
    this.root = new double[rows * rows];
    this.chunk = new double[rows * CHUNK];
  }

  /** The number of inputs with a row in W: nonlinear ones, then linear ones. */
  private int explained() {
    return axes + columns - 1;
  }

  WeightedColumns total() {
    return total;
  }

  WeightedColumns residuals() {
    return left;
  }

  /** Fills W. */
  void fillCross(double[] w) {
    for (int i = 0; i < explained(); i++) {
      for (int c = 0; c < rows; c++) {
        w[i * rows + c] = total.data()[c * total.count() + i];
      }
    }
  }

  /** Takes the columns from the expansion. */
  void fill() {
    double[] data = total.data();
    for (int c = 0; c < rows; c++) {
      int at = c * total.count();
      for (int axis = 0; axis < axes; axis++) {
        data[at + axis] = linear(axis, c);
      }
      for (int b = 1; b < columns; b++) {
        data[at + axes + b - 1] = expansion.coefficients()[c * columns + b];
      }
    }
    reduce();
    for (int c = 0; c < rows; c++) {
      System.arraycopy(root, c * rows, data, c * total.count() + explained(), rows);
      System.arraycopy(root, c * rows, left.data(), c * rows, rows);
    }
  }

  /** The coefficient of degree 1 of an axis, 0 if it does not move. */
  double linear(int axis, int component) {
    int member = expansion.set().above(0, axis);
    int first = member < 0 ? 0 : expansion.set().firstCoefficient(member);
    return member < 0 ? 0 : expansion.coefficients()[(first * rows + component) * columns];
  }

  private void reduce() {
    Arrays.fill(root, 0);
    filled = 0;
    for (int i = 1; i < expansion.set().coefficients(); i++) {
      int first = expansion.totalDegree(i) >= 2 ? 0 : 1;
      for (int column = first; column < columns; column++) {
        take(i * rows * columns + column);
      }
    }
    flush();
  }

  private void take(int start) {
    for (int c = 0; c < rows; c++) {
      chunk[c * CHUNK + filled] = expansion.coefficients()[start + c * columns];
    }
    if (++filled == CHUNK) {
      flush();
    }
  }

  private void flush() {
    for (int c = 0; c < rows; c++) {
      Arrays.fill(chunk, c * CHUNK + filled, (c + 1) * CHUNK, 0);
    }
    Householder.reduceLower(root, rows, chunk, rows, CHUNK);
    filled = 0;
  }
}

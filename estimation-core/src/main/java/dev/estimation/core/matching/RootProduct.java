package dev.estimation.core.matching;

import java.util.Arrays;

/**
 * Products A S of derivatives with a triangular part of the input's factor, row by row and four columns at a
 * time: of so few columns, loops would cost more than the arithmetic in them.
 */
final class RootProduct {
  private static final int BLOCK = 4;

  private final ActiveFactor active;
  private final int first;
  private final int count;
  private final int[] inputs;

  /** The part of the factor with the rows of inputs and the columns from {@code first} to the active count. */
  RootProduct(ActiveFactor active, int first) {
    this.active = active;
    this.first = first;
    this.count = active.count() - first;
    this.inputs = new int[count];
    Arrays.setAll(inputs, b -> active.input(first + b));
  }

  /** Fills the displacement of the inputs by a column of S, the others left alone. */
  void fillColumn(int q, double[] displacement) {
    for (int b = 0; b < count; b++) {
      displacement[inputs[b]] = entry(b, q);
    }
  }

  /** S, in the factor of the input. */
  private double entry(int b, int q) {
    return active.factor().data[inputs[b] * active.factor().numCols + first + q];
  }

  /**
   * Fills A S.
   *
   * @param a row by row, an entry for every input
   * @param rows of A
   * @param product row by row
   * @param start where the first row of the product begins
   * @param stride from one row of the product to the next
   * @return zero, or NaN if A has something that is not finite
   */
  double fill(double[] a, int rows, double[] product, int start, int stride) {
    double zero = 0;
    for (int q = 0; q < count; q += BLOCK) {
      if (count - q >= BLOCK) {
        zero += startFour(a, rows, product, start + q, stride, q);
        for (int b = q + BLOCK; b < count; b++) {
          addFour(a, rows, product, start + q, stride, b, q);
        }
      } else {
        zero += fillFew(a, rows, product, start, stride, q);
      }
    }
    return zero;
  }

  /** Four columns of A times the triangle of S on its diagonal: ten numbers that one loop keeps at hand. */
  private double startFour(double[] a, int rows, double[] product, int start, int stride, int q) {
    int n = active.factor().numCols;
    double root00 = entry(q, q);
    double root10 = entry(q + 1, q);
    double root11 = entry(q + 1, q + 1);
    double root20 = entry(q + 2, q);
    double root21 = entry(q + 2, q + 1);
    double root22 = entry(q + 2, q + 2);
    double root30 = entry(q + 3, q);
    double root31 = entry(q + 3, q + 1);
    double root32 = entry(q + 3, q + 2);
    double root33 = entry(q + 3, q + 3);
    int input0 = inputs[q];
    int input1 = inputs[q + 1];
    int input2 = inputs[q + 2];
    int input3 = inputs[q + 3];
    double zero = 0;
    for (int r = 0; r < rows; r++) {
      double a0 = a[r * n + input0];
      double a1 = a[r * n + input1];
      double a2 = a[r * n + input2];
      double a3 = a[r * n + input3];
      int at = start + r * stride;
      product[at] = a0 * root00 + a1 * root10 + (a2 * root20 + a3 * root30);
      product[at + 1] = a1 * root11 + (a2 * root21 + a3 * root31);
      product[at + 2] = a2 * root22 + a3 * root32;
      product[at + 3] = a3 * root33;
      zero += (a0 + a1 + a2 + a3) * 0;
    }
    return zero;
  }

  /** Adds column b of A times row b of S, in four columns. */
  private void addFour(
      double[] a, int rows, double[] product, int start, int stride, int b, int q) {
    int n = active.factor().numCols;
    double root0 = entry(b, q);
    double root1 = entry(b, q + 1);
    double root2 = entry(b, q + 2);
    double root3 = entry(b, q + 3);
    int input = inputs[b];
    for (int r = 0; r < rows; r++) {
      double derivative = a[r * n + input];
      int at = start + r * stride;
      product[at] += derivative * root0;
      product[at + 1] += derivative * root1;
      product[at + 2] += derivative * root2;
      product[at + 3] += derivative * root3;
    }
  }

  /** The last columns, fewer than four. */
  private double fillFew(double[] a, int rows, double[] product, int start, int stride, int q) {
    int n = active.factor().numCols;
    double zero = 0;
    for (int c = q; c < count; c++) {
      for (int r = 0; r < rows; r++) {
        double sum = 0;
        for (int b = c; b < count; b++) {
          double derivative = a[r * n + inputs[b]];
          sum += derivative * entry(b, c);
          zero += derivative * 0;
        }
        product[start + r * stride + c] = sum;
      }
    }
    return zero;
  }
}

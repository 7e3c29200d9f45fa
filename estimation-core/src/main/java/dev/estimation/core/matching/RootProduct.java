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
  private final int width;
  private final double[] root;

  /** The part of the factor with the rows of inputs and the columns from {@code first} to the active count. */
  RootProduct(ActiveFactor active, int first) {
    this.active = active;
    this.first = first;
    this.count = active.count() - first;
    this.inputs = new int[count];
    Arrays.setAll(inputs, b -> active.input(first + b));
    this.width = (count + BLOCK - 1) / BLOCK * BLOCK;
    this.root = new double[count * width];
  }

  /** Takes S, its rows padded with zeros to whole blocks. */
  void take() {
    double[] factor = active.factor().data;
    int n = active.factor().numCols;
    for (int b = 0; b < count; b++) {
      int row = inputs[b] * n + first;
      for (int q = 0; q < count; q++) {
        root[b * width + q] = factor[row + q];
      }
    }
  }

  /** Fills the displacement of the inputs by a column of S, the others left alone. */
  void fillColumn(int q, double[] displacement) {
    for (int b = 0; b < count; b++) {
      displacement[inputs[b]] = root[b * width + q];
    }
  }

  /**
   * Fills a row of A S.
   *
   * @param row where the row of A begins, which has an entry for every input
   * @param at where the row of the product begins
   * @return zero, or NaN if A has something that is not finite
   */
  double fillRow(double[] a, int row, double[] product, int at) {
    double zero = 0;
    for (int q = 0; q < count; q += BLOCK) {
      double sum0 = 0;
      double sum1 = 0;
      double sum2 = 0;
      double sum3 = 0;
      for (int b = 0, column = q; b < count; b++, column += width) {
        double derivative = a[row + inputs[b]];
        zero += derivative * 0;
        sum0 += derivative * root[column];
        sum1 += derivative * root[column + 1];
        sum2 += derivative * root[column + 2];
        sum3 += derivative * root[column + 3];
      }
      product[at + q] = sum0;
      if (q + 1 < count) {
        product[at + q + 1] = sum1;
      }
      if (q + 2 < count) {
        product[at + q + 2] = sum2;
      }
      if (q + 3 < count) {
        product[at + q + 3] = sum3;
      }
    }
    return zero;
  }
}

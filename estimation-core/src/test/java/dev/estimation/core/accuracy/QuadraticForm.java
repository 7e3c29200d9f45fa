package dev.estimation.core.accuracy;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.testing.ReferenceTable;

/** x'Ax + b'x + c of a row of gaussian_quadratic_forms.csv. */
final class QuadraticForm implements VectorFunction {
  private final double[] a;
  private final double[] b;
  private final double c;
  private final Structure structure;

  QuadraticForm(ReferenceTable.Row row, Structure structure) {
    this.a = row.numbers("a");
    this.b = row.numbers("b");
    this.c = row.number("c");
    this.structure = structure;
  }

  @Override
  public void evaluate(double[] input, double[] given, double[] output) {
    double sum = c;
    for (int i = 0; i < b.length; i++) {
      sum += b[i] * input[i];
      for (int j = 0; j < b.length; j++) {
        sum += input[i] * a[i * b.length + j] * input[j];
      }
    }
    output[0] = sum;
  }

  @Override
  public Structure structure() {
    return structure;
  }
}

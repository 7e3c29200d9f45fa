package dev.estimation.testing;

import java.math.BigDecimal;
import java.math.MathContext;
import org.ejml.data.DMatrixRMaj;

/** A small matrix of decimal numbers: sums and products are exact, inverses good to 100 digits or so. Immutable. */
public final class ExactMatrix {
  private static final MathContext DIGITS = new MathContext(120);

  private final BigDecimal[][] entries;

  private ExactMatrix(int rows, int columns, Entry entry) {
    entries = new BigDecimal[rows][columns];
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        entries[i][j] = entry.at(i, j);
      }
    }
  }

  private interface Entry {
    BigDecimal at(int row, int column);
  }

  /** The very numbers of a matrix of doubles. */
  public static ExactMatrix of(DMatrixRMaj matrix) {
    return new ExactMatrix(
        matrix.numRows, matrix.numCols, (i, j) -> new BigDecimal(matrix.get(i, j)));
  }

  /** The very numbers of rows of doubles. */
  public static ExactMatrix of(double[][] rows) {
    return of(new DMatrixRMaj(rows));
  }

  /** A column of doubles. */
  public static ExactMatrix column(double... values) {
    return of(DMatrixRMaj.wrap(values.length, 1, values));
  }

  private int rows() {
    return entries.length;
  }

  private int columns() {
    return entries[0].length;
  }

  /** The sum. */
  public ExactMatrix plus(ExactMatrix other) {
    return new ExactMatrix(rows(), columns(), (i, j) -> entries[i][j].add(other.entries[i][j]));
  }

  /** The difference. */
  public ExactMatrix minus(ExactMatrix other) {
    return new ExactMatrix(
        rows(), columns(), (i, j) -> entries[i][j].subtract(other.entries[i][j]));
  }

  /** The product, of at most 120 digits. */
  public ExactMatrix times(ExactMatrix other) {
    return new ExactMatrix(rows(), other.columns(), (i, j) -> {
      BigDecimal sum = BigDecimal.ZERO;
      for (int k = 0; k < columns(); k++) {
        sum = sum.add(entries[i][k].multiply(other.entries[k][j]));
      }
      return sum.round(DIGITS);
    });
  }

  /** The transpose. */
  public ExactMatrix transposed() {
    return new ExactMatrix(columns(), rows(), (i, j) -> entries[j][i]);
  }

  /** The inverse, by Gauss and Jordan with the largest pivot of each column. */
  public ExactMatrix inverse() {
    int n = rows();
    BigDecimal[][] work = new BigDecimal[n][2 * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        work[i][j] = entries[i][j];
        work[i][n + j] = i == j ? BigDecimal.ONE : BigDecimal.ZERO;
      }
    }
    for (int pivot = 0; pivot < n; pivot++) {
      bringLargestUp(work, pivot);
      eliminate(work, pivot);
    }
    return new ExactMatrix(n, n, (i, j) -> work[i][n + j]);
  }

  private static void bringLargestUp(BigDecimal[][] work, int pivot) {
    int best = pivot;
    for (int i = pivot + 1; i < work.length; i++) {
      best = work[i][pivot].abs().compareTo(work[best][pivot].abs()) > 0 ? i : best;
    }
    BigDecimal[] row = work[best];
    work[best] = work[pivot];
    work[pivot] = row;
  }

  private static void eliminate(BigDecimal[][] work, int pivot) {
    BigDecimal scale = work[pivot][pivot];
    for (int j = 0; j < work[pivot].length; j++) {
      work[pivot][j] = work[pivot][j].divide(scale, DIGITS);
    }
    for (int i = 0; i < work.length; i++) {
      BigDecimal factor = work[i][pivot];
      for (int j = 0; j < work[i].length && i != pivot; j++) {
        work[i][j] = work[i][j].subtract(factor.multiply(work[pivot][j])).round(DIGITS);
      }
    }
  }

  /** An entry, rounded. */
  public double get(int row, int column) {
    return entries[row][column].doubleValue();
  }
}

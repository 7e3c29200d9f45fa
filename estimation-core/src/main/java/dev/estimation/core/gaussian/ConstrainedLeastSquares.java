package dev.estimation.core.gaussian;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.ejml.data.DMatrixRMaj;

/**
 * The displacement that fulfils exact equations and fits the others best. With S a scale of each component, the exact
 * ones C S f = c leave f = f0 + Z g, Z orthonormal, found from [R; 0] = Q' (C S)' E; the others, divided
 * by their deviations, are the least squares of A S Z g = b - A S f0, reduced once more. No covariance is inverted and no
 * normal equations are formed. Confined to one thread.
 */
final class ConstrainedLeastSquares {
  private static final double EPSILON = 0x1p-52;

  /** Exact equations closer to each other than this are the same one; then they must agree as well. */
  private static final double SAME = 1e-10;

  private final int d;
  private final List<LinearEquation> exact = new ArrayList<>();
  private final List<LinearEquation> uncertain = new ArrayList<>();
  private final double[] scale;
  private double[] solution;
  private double[][] free;
  private final DMatrixRMaj covariance;

  ConstrainedLeastSquares(List<LinearEquation> equations, int d) {
    this.d = d;
    this.scale = new double[d];
    this.covariance = new DMatrixRMaj(d, d);
    equations.forEach(equation -> (equation.deviation() > 0 ? uncertain : exact).add(equation));
    for (int i = 0; i < d; i++) {
      double weight = largest(uncertain, i);
      weight = weight > 0 ? weight : largest(exact, i);
      scale[i] = weight > 0 ? 1 / weight : 1;
    }
    fulfil();
    if (free.length > 0) {
      fit();
    }
    for (int i = 0; i < d; i++) {
      solution[i] *= scale[i];
    }
  }

  private static double largest(List<LinearEquation> equations, int component) {
    return equations.stream().mapToDouble(row -> row.weight(component)).max().orElse(0);
  }

  /** h S, divided by a number. */
  private double[] scaled(LinearEquation row, double divisor) {
    double[] result = new double[d];
    for (int i = 0; i < d; i++) {
      result[i] = row.coefficients()[i] * scale[i] / divisor;
    }
    return result;
  }

  /** Sets f0 and the rows of Z' from the exact equations, each of length 1. */
  private void fulfil() {
    double[][] rows = new double[exact.size()][];
    double[] values = new double[exact.size()];
    double[][] transposed = new double[d][exact.size()];
    double[][] turned = identity();
    for (int r = 0; r < rows.length; r++) {
      double length = Math.sqrt(dot(scaled(exact.get(r), 1), scaled(exact.get(r), 1)));
      length = length > 0 ? length : 1;
      rows[r] = scaled(exact.get(r), length);
      values[r] = exact.get(r).value() / length;
      for (int i = 0; i < d; i++) {
        transposed[i][r] = rows[r][i];
      }
    }
    PivotedReduction reduction = new PivotedReduction(transposed, turned, rows.length);
    int rank = reduction.rank(SAME);
    solution = new double[d];
    for (int r = 0; r < rank; r++) {
      int row = reduction.column(r);
      double rest = values[row] - dot(rows[row], solution);
      addScaled(solution, turned[r], rest / reduction.entry(r, r));
    }
    free = Arrays.copyOfRange(turned, rank, d);
    for (int r = rank; r < rows.length; r++) {
      requireAgreement(exact.get(reduction.column(r)));
    }
  }

  private void requireAgreement(LinearEquation row) {
    double rest = row.value() - dot(scaled(row, 1), solution);
    if (!(Math.abs(rest) <= SAME * row.size())) {
      throw new IllegalArgumentException("estimates without variance must agree, but estimate "
          + row.source() + " contradicts those before it by " + rest);
    }
  }

  /** Fits the rest, the rows with the largest weights first. */
  private void fit() {
    int k = free.length;
    List<double[]> rows = new ArrayList<>();
    for (LinearEquation equation : uncertain) {
      double[] a = scaled(equation, equation.deviation());
      double[] row = new double[k + 1];
      for (int j = 0; j < k; j++) {
        row[j] = dot(a, free[j]);
      }
      row[k] = equation.value() / equation.deviation() - dot(a, solution);
      rows.add(row);
    }
    rows.sort(Comparator.comparingDouble(row -> -largestEntry(row, k)));
    double[][] target = rows.stream().map(row -> new double[] {row[k]}).toArray(double[][]::new);
    PivotedReduction reduction = new PivotedReduction(rows.toArray(double[][]::new), target, k);
    double first = rows.isEmpty() ? 0 : Math.abs(reduction.entry(0, 0));
    int rank = reduction.rank(Math.max(rows.size(), k) * EPSILON * first);
    if (rank < k) {
      throw new IllegalArgumentException("estimates must determine all " + d
          + " components of the state, got " + (d - k + rank) + " independent ones");
    }
    accumulate(reduction, target);
  }

  /** Row by row of the root S Z E R^-1, from the last: its columns, times the target, are the solution. */
  private void accumulate(PivotedReduction reduction, double[][] target) {
    int k = free.length;
    double[][] columns = new double[k][];
    for (int c = 0; c < k; c++) {
      double[] column = free[reduction.column(c)].clone();
      for (int r = 0; r < c; r++) {
        addScaled(column, columns[r], -reduction.entry(r, c));
      }
      for (int i = 0; i < d; i++) {
        column[i] /= reduction.entry(c, c);
      }
      columns[c] = column;
      addScaled(solution, column, target[c][0]);
    }
    for (int i = 0; i < d; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (double[] column : columns) {
          sum += column[i] * column[j];
        }
        covariance.set(i, j, scale[i] * scale[j] * sum);
        covariance.set(j, i, covariance.get(i, j));
      }
    }
  }

  private static double largestEntry(double[] row, int count) {
    double largest = 0;
    for (int i = 0; i < count; i++) {
      largest = Math.max(largest, Math.abs(row[i]));
    }
    return largest;
  }

  private double[][] identity() {
    double[][] result = new double[d][d];
    for (int i = 0; i < d; i++) {
      result[i][i] = 1;
    }
    return result;
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  private static void addScaled(double[] target, double[] vector, double factor) {
    for (int i = 0; i < target.length; i++) {
      target[i] += factor * vector[i];
    }
  }

  double[] solution() {
    return solution;
  }

  DMatrixRMaj covariance() {
    return covariance;
  }
}

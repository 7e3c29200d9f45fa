package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * Carries moments by a polynomial of first or second degree in unit coordinates xi ~ N(0, I): z_i =
 * g_i(m) + w_i' xi + xi' M_i xi / 2. Its mean is g_i(m) + tr(M_i) / 2, its covariance w_i' w_j +
 * tr(M_i M_j) / 2, of which regression on xi explains the first term: each is a sum of squares.
 */
abstract class TaylorWorkspace extends BaseWorkspace {
  private final int k;
  private final int pairs;
  private final WeightedColumns columns;
  private final WeightedColumns bends;
  private final double[] shift;

  TaylorWorkspace(
      Space input, Space output, VectorFunction function, boolean secondOrder, Form form) {
    super(input, output, function, function.structure().activeInputs(input.dimension()), form);
    this.k = active.count();
    int m = output.dimension();
    this.pairs = secondOrder ? k * (k + 1) / 2 : 0;
    double[] pairWeights = new double[pairs];
    Arrays.fill(pairWeights, 1); // (a, b) stands for (b, a) as well
    for (int a = 0; a < k && secondOrder; a++) {
      pairWeights[pair(a, a)] = 0.5;
    }
    double[] weights = new double[k + pairs];
    Arrays.fill(weights, 1);
    System.arraycopy(pairWeights, 0, weights, k, pairs);
    this.columns = new WeightedColumns(m, weights, form);
    this.bends = new WeightedColumns(m, pairWeights, form);
    this.shift = new double[m];
  }

  /** The columns: W', then M_ab of all outputs, b up to a. Row by row, each as long as {@link #width}. */
  final double[] slopesAndBends() {
    return columns.data();
  }

  final int width() {
    return k + pairs;
  }

  /** The column of W', or of M_ab for b up to a, among the columns. */
  final int bend(int a, int b) {
    return k + pair(a, b);
  }

  private static int pair(int a, int b) {
    return a * (a + 1) / 2 + b;
  }

  /** Fills {@link #slopesAndBends()}. */
  abstract MatchingStatus expand(double[] mean, double[] given);

  @Override
  final MatchingStatus match(double[] mean, double[] given, Use use, double[] outputMean) {
    MatchingStatus expanded = expand(mean, given);
    if (expanded != MatchingStatus.MATCHED) {
      return expanded;
    }
    if (pairs > 0) {
      fillShift();
    }
    outputSpace.displace(centre, shift, outputMean); // also brings angles into their range
    return MatchingStatus.MATCHED;
  }

  /** tr(M_i) / 2. */
  private void fillShift() {
    for (int i = 0; i < shift.length; i++) {
      double trace = 0;
      for (int a = 0; a < k; a++) {
        trace += columns.data()[i * width() + bend(a, a)];
      }
      shift[i] = trace / 2;
    }
  }

  @Override
  final WeightedColumns columns() {
    return columns;
  }

  /** tr(M_i M_j) / 2: what W does not explain. */
  @Override
  final WeightedColumns residuals() {
    for (int i = 0; i < shift.length; i++) {
      System.arraycopy(columns.data(), i * width() + k, bends.data(), i * pairs, pairs);
    }
    return bends;
  }

  @Override
  final void fillCross(double[] w) {
    int m = shift.length;
    for (int a = 0; a < k; a++) {
      for (int i = 0; i < m; i++) {
        w[a * m + i] = columns.data()[i * width() + a];
      }
    }
  }
}

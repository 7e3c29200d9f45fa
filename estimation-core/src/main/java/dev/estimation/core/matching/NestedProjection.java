package dev.estimation.core.matching;

import dev.estimation.core.points.NestedNodes;

/**
 * Projections on one axis, from values at nested nodes to coefficients of Hermite polynomials. With h_j = He_j / sqrt(j!),
 * for which E h_i h_j is 1 or 0, level l gives c_j = sum_k w_lk h_j(x_k) f(x_k) for j to {@link #degree}: as far as the
 * rule of the level is exact for every product of two of them. <i>Immutable.</i>
 */
final class NestedProjection {
  private final NestedNodes nodes = NestedNodes.standardNormal();
  private final int levels = nodes.levels();
  private final double[][] changes = new double[levels][];
  private final int[] counts = new int[levels + 1];
  private final int[] degrees = new int[levels + 1];

  NestedProjection() {
    degrees[0] = -1;
    for (int level = 0; level < levels; level++) {
      counts[level + 1] = nodes.count(level);
      degrees[level + 1] = nodes.degree(level) / 2;
    }
    for (int level = 0; level < levels; level++) {
      changes[level] = projection(level);
      if (level > 0) {
        subtract(level);
      }
    }
  }

  private double[] projection(int level) {
    int count = nodes.count(level);
    double[] result = new double[(degree(level) + 1) * count];
    double[] values = new double[degree(level) + 1];
    for (int k = 0; k < count; k++) {
      fillPolynomials(nodes.node(k), values, 0, values.length);
      for (int j = 0; j < values.length; j++) {
        result[j * count + k] = nodes.weight(level, k) * values[j];
      }
    }
    return result;
  }

  /** Takes the projection of the level before away. */
  private void subtract(int level) {
    int before = nodes.count(level - 1);
    double[] smaller = projection(level - 1);
    for (int j = 0; j <= degree(level - 1); j++) {
      for (int k = 0; k < before; k++) {
        changes[level][j * nodes.count(level) + k] -= smaller[j * before + k];
      }
    }
  }

  /** Fills h_0(x), h_1(x), ... from a place of an array on. */
  static void fillPolynomials(double x, double[] values, int start, int count) {
    values[start] = 1;
    for (int j = 1; j < count; j++) {
      double before = j == 1 ? 0 : values[start + j - 2];
      values[start + j] = (x * values[start + j - 1] - Math.sqrt(j - 1) * before) / Math.sqrt(j);
    }
  }

  int levels() {
    return levels;
  }

  /** The number of nodes of a level, those of the levels before first; 0 for level -1. */
  int nodes(int level) {
    return counts[level + 1];
  }

  double node(int index) {
    return nodes.node(index);
  }

  /** The highest degree of a level: 0, 2, 7, 14, 25; -1 for level -1. */
  int degree(int level) {
    return degrees[level + 1];
  }

  /**
   * What a level changes of the coefficients of the one before: (degree + 1) x nodes, row by row. Only read.
   */
  double[] change(int level) {
    return changes[level];
  }
}

package dev.estimation.core.points;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Builds one sparse grid; see {@link SparseGridRule}. <i>Confined to one thread, used once.</i>
 *
 * <p>The weight of a point is the sum over all l within the budget of the products of its difference
 * weights. It is had from polynomials in the cost: the coefficient b of an axis is the difference weight
 * of the level of cost b, or 0; the product over the axes up to the budget, summed, is the weight. Axes on
 * which the point is at the centre are alike; their powers are made once. The others are multiplied in
 * the order of their nodes, so points that differ by the order or the sign of coordinates have equal bits.
 */
final class SparseGrid {
  private final NestedNodes nodes;
  private final int[] costs;
  private final int budget;
  private final int dimension;
  private final int mostMoved;
  private final double[][] centrePowers;
  private final double[] point;
  private final int[] moved;
  private final List<double[]> points = new ArrayList<>();
  private final List<Double> weights = new ArrayList<>();

  SparseGrid(NestedNodes nodes, int[] costs, int budget, int dimension) {
    this.nodes = nodes;
    this.costs = costs;
    this.budget = budget;
    this.dimension = dimension;
    this.mostMoved = Math.min(dimension, budget);
    this.centrePowers = new double[mostMoved + 1][];
    this.point = new double[dimension];
    this.moved = new int[mostMoved];
  }

  /** The number of points of nodes within the budget, the centre included. */
  double count() {
    double[] ofOneAxis = nodesByCost();
    double[] count = unit();
    for (int axis = 0; axis < dimension; axis++) {
      count = product(count, ofOneAxis);
    }
    return Arrays.stream(count).sum();
  }

  private double[] nodesByCost() {
    double[] result = new double[budget + 1];
    for (int level = 0; level < nodes.levels() && costs[level] <= budget; level++) {
      result[costs[level]] = nodes.count(level) - (level == 0 ? 0 : nodes.count(level - 1));
    }
    return result;
  }

  UnitPoints points() {
    double[] centre = differences(0);
    double[] power = unit();
    for (int axes = 0; axes <= dimension; axes++) {
      if (dimension - axes <= mostMoved) {
        centrePowers[dimension - axes] = power;
      }
      power = product(power, centre);
    }
    addFrom(0, budget, 0);
    double centreWeight = weight(0);
    double[] others = weights.stream().mapToDouble(Double::doubleValue).toArray();
    return UnitPoints.of(
        dimension, centreWeight, centreWeight, points.toArray(new double[0][]), others);
  }

  /** Adds all points that move, after those axes that have moved, further axes or none. */
  private void addFrom(int firstAxis, int rest, int count) {
    for (int axis = firstAxis; axis < dimension; axis++) {
      for (int index = 1; index < nodes.count(nodes.levels() - 1); index++) {
        int after = rest - costs[nodes.firstLevel(index)];
        if (after < 0) {
          break;
        }
        point[axis] = nodes.node(index);
        moved[count] = index;
        add(count + 1);
        addFrom(axis + 1, after, count + 1);
        point[axis] = 0;
      }
    }
  }

  private void add(int count) {
    double weight = weight(count);
    if (weight != 0) {
      points.add(point.clone());
      weights.add(weight);
    }
  }

  /** The weight of the point of the first {@code count} moved axes. */
  private double weight(int count) {
    int[] sorted = new int[count];
    for (int i = 0; i < count; i++) {
      // +x and -x have equal weights.
      sorted[i] = moved[i] + moved[i] % 2;
    }
    Arrays.sort(sorted);
    double[] product = centrePowers[count];
    for (int index : sorted) {
      product = product(product, differences(index));
    }
    return Arrays.stream(product).sum();
  }

  /** The difference weights of a node by the costs of their levels. */
  private double[] differences(int index) {
    double[] result = new double[budget + 1];
    for (int level = nodes.firstLevel(index); level < nodes.levels(); level++) {
      if (costs[level] <= budget) {
        result[costs[level]] = nodes.difference(level, index);
      }
    }
    return result;
  }

  private double[] unit() {
    double[] result = new double[budget + 1];
    result[0] = 1;
    return result;
  }

  /** The product of two polynomials, without what is beyond the budget. */
  private double[] product(double[] a, double[] b) {
    double[] result = new double[budget + 1];
    for (int i = 0; i <= budget; i++) {
      for (int j = 0; i + j <= budget && a[i] != 0; j++) {
        result[i + j] += a[i] * b[j];
      }
    }
    return result;
  }
}

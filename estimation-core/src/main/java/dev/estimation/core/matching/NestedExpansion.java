package dev.estimation.core.matching;

import java.util.Arrays;

/**
 * A function of unit normal inputs as a sum of products of Hermite polynomials (see {@link NestedProjection}), with
 * coefficients from values at nested nodes: over each member of a set of levels, the product of what the level of
 * each axis changes. Sums of functions of one axis each need no node off the axes. Values are kept, none is
 * asked for twice.
 *
 * <p>Since the polynomials have E h_a h_b of 1 or 0, moments are read off: the coefficient of degree 0 is the mean, those of
 * degree 1 are the cross-covariance with the inputs, and the squares of the others sum to what a regression on them does
 * not explain, positive semi-definite whatever the weights. Source: Constantine, Eldred and Phipps 2012, <i>Sparse
 * pseudospectral approximation method</i>, Computer Methods in Applied Mechanics and Engineering 229; Conrad and Marzouk
 * 2013, <i>Adaptive Smolyak pseudospectral approximations</i>, SIAM Journal on Scientific Computing 35 (from memory).
 * <i>Confined to one thread</i>; allocates only when built.
 */
final class NestedExpansion {
  /** Gives values at a point in unit coordinates. */
  interface Source {
    /** Fills a block of values from a place on; false if one of them is not finite. */
    boolean fill(double[] unit, double[] values, int start);
  }

  private final NestedProjection projection = new NestedProjection();
  private final int axes;
  private final int width;
  private final Source source;
  private final LevelSet set;
  private final double[] values;
  private final double[] coefficients;
  private final byte[] degrees;
  private double[] tensor;
  private double[] transformed;
  private final double[] unit;
  private final int[] moved;
  private final int[] counts;
  private final int[] indices;
  private int movedCount;

  /** An expansion of blocks of so many values, over so many nodes at most. */
  NestedExpansion(int axes, int width, int mostNodes, Source source) {
    this.axes = axes;
    this.width = width;
    this.source = source;
    this.set = new LevelSet(projection, axes, mostNodes);
    this.values = new double[mostNodes * width];
    this.coefficients = new double[mostNodes * width];
    this.degrees = new byte[mostNodes];
    this.tensor = new double[mostNodes * width];
    this.transformed = new double[mostNodes * width];
    this.unit = new double[axes];
    this.moved = new int[axes];
    this.counts = new int[axes];
    this.indices = new int[axes];
  }

  LevelSet set() {
    return set;
  }

  NestedProjection projection() {
    return projection;
  }

  /** The block of coefficient i begins at i * width. */
  double[] coefficients() {
    return coefficients;
  }

  /** The sum of the degrees of a coefficient over the axes. */
  int totalDegree(int coefficient) {
    return degrees[coefficient];
  }

  /** The number of degrees that a level brings on an axis. */
  int degreesAdded(int level) {
    return projection.degree(level) - projection.degree(level - 1);
  }

  /** Begins anew with the value at the centre; false if it is not finite. */
  boolean begin() {
    set.begin();
    Arrays.fill(unit, 0);
    degrees[0] = 0;
    boolean finite = source.fill(unit, values, 0);
    System.arraycopy(values, 0, coefficients, 0, width);
    return finite;
  }

  /**
   * Adds a member above another, which must be open.
   *
   * @return the new member, or -1 if a value is not finite: then it is closed, and all else as it was
   */
  int add(int member, int axis) {
    int added = set.add(member, axis);
    listMoved(added);
    if (!fillValues(added)) {
      set.removeLast(member, axis);
      return -1;
    }
    fillDegrees(added);
    Arrays.fill(
        coefficients,
        set.firstCoefficient(added) * width,
        (set.firstCoefficient(added) + set.coefficients(added)) * width,
        0);
    gather(added);
    transform(added);
    scatter(added);
    return added;
  }

  private void listMoved(int member) {
    movedCount = 0;
    for (int axis = 0; axis < axes; axis++) {
      if (set.level(member, axis) > 0) {
        moved[movedCount++] = axis;
      }
    }
  }

  /** Values at the nodes that no member below has. */
  private boolean fillValues(int member) {
    Arrays.fill(unit, 0);
    int first = set.firstNode(member);
    for (int node = 0; node < set.nodes(member); node++) {
      int rest = node;
      for (int i = movedCount - 1; i >= 0; i--) {
        int level = set.level(member, moved[i]);
        int before = projection.nodes(level - 1);
        int count = projection.nodes(level) - before;
        unit[moved[i]] = projection.node(before + rest % count);
        rest /= count;
      }
      if (!source.fill(unit, values, (first + node) * width)) {
        return false;
      }
    }
    return true;
  }

  private void fillDegrees(int member) {
    int first = set.firstCoefficient(member);
    for (int coefficient = 0; coefficient < set.coefficients(member); coefficient++) {
      int rest = coefficient;
      int total = 0;
      for (int i = movedCount - 1; i >= 0; i--) {
        int level = set.level(member, moved[i]);
        total += projection.degree(level - 1) + 1 + rest % degreesAdded(level);
        rest /= degreesAdded(level);
      }
      degrees[first + coefficient] = (byte) total;
    }
  }

  /** Brings the values at all nodes of a member, those of members below it included, into one tensor. */
  private void gather(int member) {
    for (int i = 0; i < movedCount; i++) {
      counts[i] = projection.nodes(set.level(member, moved[i]));
    }
    copyBlocks(member, true);
  }

  /** Adds a tensor of coefficients to those of the member and of all below it. */
  private void scatter(int member) {
    for (int i = 0; i < movedCount; i++) {
      counts[i] = projection.degree(set.level(member, moved[i])) + 1;
    }
    copyBlocks(member, false);
  }

  private void copyBlocks(int member, boolean gathering) {
    Arrays.fill(indices, 0, movedCount, 0);
    int size = size();
    for (int at = 0; at < size; at++) {
      int under = member;
      int place = 0;
      for (int i = 0; i < movedCount; i++) {
        int level = levelOf(indices[i], gathering);
        for (int l = set.level(member, moved[i]); l > level; l--) {
          under = set.below(under, moved[i]);
        }
        int start = gathering ? projection.nodes(level - 1) : projection.degree(level - 1) + 1;
        int end = gathering ? projection.nodes(level) : projection.degree(level) + 1;
        place = place * (end - start) + indices[i] - start;
      }
      if (gathering) {
        System.arraycopy(values, (set.firstNode(under) + place) * width, tensor, at * width, width);
      } else {
        int start = (set.firstCoefficient(under) + place) * width;
        for (int c = 0; c < width; c++) {
          coefficients[start + c] += tensor[at * width + c];
        }
      }
      next();
    }
  }

  /** The level that brings a node or a degree. */
  private int levelOf(int index, boolean node) {
    int level = 0;
    while (index > (node ? projection.nodes(level) - 1 : projection.degree(level))) {
      level++;
    }
    return level;
  }

  /** Counts the indices on, the last one fastest. */
  private void next() {
    for (int i = movedCount - 1; i >= 0 && ++indices[i] == counts[i]; i--) {
      indices[i] = 0;
    }
  }

  private int size() {
    int size = 1;
    for (int i = 0; i < movedCount; i++) {
      size *= counts[i];
    }
    return size;
  }

  /** From values to changes of coefficients, axis by axis. */
  private void transform(int member) {
    for (int i = 0; i < movedCount; i++) {
      int level = set.level(member, moved[i]);
      transformAxis(i, projection.change(level), projection.degree(level) + 1);
    }
  }

  private void transformAxis(int axis, double[] matrix, int rows) {
    int columns = counts[axis];
    int outer = 1;
    int inner = width;
    for (int i = 0; i < movedCount; i++) {
      outer *= i < axis ? counts[i] : 1;
      inner *= i > axis ? counts[i] : 1;
    }
    for (int o = 0; o < outer; o++) {
      for (int r = 0; r < rows; r++) {
        int to = (o * rows + r) * inner;
        Arrays.fill(transformed, to, to + inner, 0);
        for (int c = 0; c < columns; c++) {
          double factor = matrix[r * columns + c];
          int from = (o * columns + c) * inner;
          for (int j = 0; j < inner; j++) {
            transformed[to + j] += factor * tensor[from + j];
          }
        }
      }
    }
    counts[axis] = rows;
    double[] other = tensor;
    tensor = transformed;
    transformed = other;
  }

  /**
   * Adds the expansion at +x and -x, apart by parity: a sum of even total degrees, and of odd ones.
   *
   * @param polynomials of every axis at x, from a place on, {@code stride} numbers each, filled by {@link
   *     NestedProjection#fillPolynomials}
   * @param even updated, a block from a place on
   * @param odd updated likewise
   */
  void addAt(double[] polynomials, int first, int stride, double[] even, double[] odd, int start) {
    for (int member = 0; member < set.size(); member++) {
      listMoved(member);
      for (int i = 0; i < movedCount; i++) {
        counts[i] = degreesAdded(set.level(member, moved[i]));
      }
      Arrays.fill(indices, 0, movedCount, 0);
      for (int place = 0; place < set.coefficients(member); place++) {
        double product = 1;
        for (int i = 0; i < movedCount; i++) {
          int lowest = projection.degree(set.level(member, moved[i]) - 1) + 1;
          product *= polynomials[first + moved[i] * stride + lowest + indices[i]];
        }
        int coefficient = set.firstCoefficient(member) + place;
        double[] sum = degrees[coefficient] % 2 == 0 ? even : odd;
        for (int c = 0; c < width; c++) {
          sum[start + c] += product * coefficients[coefficient * width + c];
        }
        next();
      }
    }
  }
}

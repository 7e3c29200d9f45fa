package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Covariance;
import java.util.Arrays;

/**
 * The sizes of an expansion's terms in deviations of what they are measured by. A block holds z and, as further
 * columns, its slopes by unit linear inputs; a slope counts one degree more than z does. <i>Confined to one thread</i>;
 * allocates only when built.
 */
final class ExpansionNorms {
  private final NestedExpansion expansion;
  private final LevelSet set;
  private final int axes;
  private final int rows;
  private final int columns;
  private final int width;
  private final ErrorScale scale;
  private final double[] squares;
  private final double[] quadratic;
  private final double[] bends;
  private double bent;

  /** Norms of blocks of rows x columns, of so many coefficients at most. */
  ExpansionNorms(NestedExpansion expansion, int axes, int rows, int columns, int most) {
    this.expansion = expansion;
    this.set = expansion.set();
    this.axes = axes;
    this.rows = rows;
    this.columns = columns;
    this.width = rows * columns;
    this.scale = new ErrorScale(rows);
    this.squares = new double[most];
    this.quadratic = new double[axes * width];
    this.bends = new double[axes];
  }

  /** Begins the scale: the noise, and the terms that a prediction or an update is measured by. */
  void begin(Covariance noise, Use use) {
    scale.begin(noise);
    int least = use == Use.PREDICTION ? 1 : 2;
    for (int i = 0; i < set.coefficients(); i++) {
      for (int column = 0; column < columns; column++) {
        if (degree(i, column) >= least) {
          scale.addSquare(expansion.coefficients(), i * width + column, columns);
        }
      }
    }
  }

  private int degree(int coefficient, int column) {
    return expansion.totalDegree(coefficient) + (column == 0 ? 0 : 1);
  }

  /** Adds a block to the scale, so that its directions are in it. */
  void include(double[] blocks, int start) {
    for (int column = 0; column < columns; column++) {
      scale.addSquare(blocks, start + column, columns);
    }
  }

  /** Ends the scale, with a variance for each component of which nothing smaller is seen, and measures all terms. */
  void end(double[] rounding) {
    for (int row = 0; row < rows; row++) {
      scale.addVariance(row, rounding[row]);
    }
    scale.factor();
    bent = 0;
    for (int i = 0; i < set.coefficients(); i++) {
      squares[i] = 0;
      for (int column = 0; column < columns; column++) {
        double square = scale.square(expansion.coefficients(), i * width + column, columns);
        squares[i] += square;
        bent += degree(i, column) >= 2 ? square : 0;
      }
    }
    Arrays.fill(quadratic, 0);
    for (int axis = 0; axis < axes; axis++) {
      measureAxis(axis);
    }
  }

  /** The second degree of an axis, and which share of its effect is not linear. */
  private void measureAxis(int axis) {
    bends[axis] = 0;
    int member = set.above(0, axis);
    if (member < 0) {
      return;
    }
    int first = set.firstCoefficient(member);
    double linear = scale.square(expansion.coefficients(), first * width, columns);
    double rest = squares[first] - linear + squares[first + 1];
    for (int column = 0; column < columns; column++) {
      int from = (first + 1) * width + column;
      int to = (axis * columns + column) * rows;
      scale.fillUnit(expansion.coefficients(), from, columns, quadratic, to);
    }
    if (rest > 0 && Double.isFinite(linear)) {
      bends[axis] = Math.sqrt(rest) / (Math.sqrt(linear) + Math.sqrt(rest));
    }
  }

  /** The squared length of a block. */
  double square(double[] blocks, int start) {
    double sum = 0;
    for (int column = 0; column < columns; column++) {
      sum += scale.square(blocks, start + column, columns);
    }
    return sum;
  }

  /** The squares of all terms of degree 2 and more. */
  double bent() {
    return bent;
  }

  /** From 0, linear, to 1. */
  double bend(int axis) {
    return bends[axis];
  }

  /**
   * The square of the product term of two axes, if the function were one of a linear combination of them: twice the
   * product of their second degrees.
   */
  double pair(int one, int other) {
    double sum = 0;
    for (int c = 0; c < width; c++) {
      sum += Math.abs(quadratic[one * width + c] * quadratic[other * width + c]);
    }
    return 2 * sum;
  }

  /** The squares of all terms that a member brings. */
  double block(int member) {
    double sum = 0;
    int first = set.firstCoefficient(member);
    for (int i = 0; i < set.coefficients(member); i++) {
      sum += squares[first + i];
    }
    return sum;
  }

  /**
   * How much longer the two highest degrees on an axis, from the second level on, are than the two before them: below 1
   * where the series converges.
   */
  double decay(int member, int axis) {
    int count = expansion.degreesAdded(set.level(member, axis));
    double last = ofDegrees(member, axis, count - 2, count);
    double before = ofDegrees(member, axis, count - 4, count - 2);
    return last == 0 ? 0 : Math.sqrt(last / before);
  }

  /** The squares of those of its terms that are of the two highest degrees on an axis, of level 1 the highest. */
  double edge(int member, int axis) {
    int count = expansion.degreesAdded(set.level(member, axis));
    int top = set.level(member, axis) == 1 ? 1 : 2;
    return ofDegrees(member, axis, count - top, count);
  }

  /** The squares of the terms whose degrees on an axis are some of those that a member brings. */
  private double ofDegrees(int member, int axis, int from, int to) {
    int inner = 1;
    for (int other = axis + 1; other < axes; other++) {
      inner *= expansion.degreesAdded(set.level(member, other));
    }
    int count = expansion.degreesAdded(set.level(member, axis));
    double sum = 0;
    int first = set.firstCoefficient(member);
    for (int i = 0; i < set.coefficients(member); i++) {
      int degree = i / inner % count;
      sum += from <= degree && degree < to ? squares[first + i] : 0;
    }
    return sum;
  }
}

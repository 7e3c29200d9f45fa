package dev.estimation.core.matching;

import java.util.Arrays;

/**
 * Values of a function at pairs of points +v and -v off the axes, against which an expansion is tested: what it misses
 * there, of the even and of the odd part. All components of v differ from zero and from each other, so that no term
 * of a few inputs goes unseen; each pair has signs of its own, so that terms do not cancel twice. Where a single
 * axis varies, the first pair is at nodes that the expansion takes later, and what is missed is brought to the size of
 * coefficients of degrees 3 and 4. <i>Confined to one thread</i>; allocates only when built.
 */
final class ProbePairs {
  private static final int MOST = 8;
  private static final double LEAST_REACH = 1.1;
  private static final double MOST_REACH = 1.6;
  private static final double GOLDEN = (Math.sqrt(5) - 1) / 2;
  private static final double SHIFT = Math.sqrt(2) - 1;

  /** Of +2.861, in the second level: it sees well beyond the three nodes of the first. */
  private static final int FAR_NODE = 5;

  private final NestedExpansion expansion;
  private final NestedExpansion.Source source;
  private final int axes;
  private final int width;
  private final int stride;
  private final double[] unit;
  private final double[] values;
  private final double[] polynomials;
  private final double[] even;
  private final double[] odd;
  private int singleAxis;
  private double singleReach;
  private int size;
  private int tried;

  ProbePairs(NestedExpansion expansion, int axes, int width, NestedExpansion.Source source) {
    this.expansion = expansion;
    this.source = source;
    this.axes = axes;
    this.width = width;
    NestedProjection projection = expansion.projection();
    this.stride = projection.degree(projection.levels() - 1) + 1;
    this.unit = new double[axes];
    this.values = new double[2 * MOST * width];
    this.polynomials = new double[MOST * axes * stride];
    this.even = new double[MOST * width];
    this.odd = new double[MOST * width];
  }

  /** Begins anew; the axis is the one that varies, or -1 if several do. */
  void begin(int onlyAxis) {
    singleAxis = onlyAxis;
    size = 0;
    tried = 0;
  }

  int size() {
    return size;
  }

  /** Whether there is a further direction to try. */
  boolean hasNext() {
    return tried < MOST;
  }

  /** Evaluates a further pair; false if a value is not finite: it is left out. */
  boolean add() {
    int plus = 2 * size * width;
    aim(tried++);
    if (!source.fill(unit, values, plus)) {
      return false;
    }
    for (int axis = 0; axis < axes; axis++) {
      int start = (size * axes + axis) * stride;
      NestedProjection.fillPolynomials(unit[axis], polynomials, start, stride);
      unit[axis] = -unit[axis];
    }
    boolean finite = source.fill(unit, values, plus + width);
    size += finite ? 1 : 0;
    return finite;
  }

  private void aim(int pair) {
    for (int axis = 0; axis < axes; axis++) {
      double fraction = (axis + 1) * GOLDEN + pair * SHIFT;
      double reach = LEAST_REACH + (MOST_REACH - LEAST_REACH) * (fraction - Math.floor(fraction));
      unit[axis] = Integer.bitCount(axis & pair) % 2 == 0 ? reach : -reach;
    }
    if (singleAxis >= 0) {
      singleReach = farNode() / (1 + pair * SHIFT);
      unit[singleAxis] = singleReach;
    }
  }

  private double farNode() {
    return expansion.projection().node(FAR_NODE);
  }

  /** Fills a block with what is known already at a point of a single axis; false if nothing is. */
  boolean fillKnown(double[] point, double[] block, int start) {
    if (singleAxis < 0 || size == 0 || Math.abs(point[singleAxis]) != singleReach) {
      return false;
    }
    int from = point[singleAxis] > 0 ? 0 : width;
    System.arraycopy(values, from, block, start, width);
    return true;
  }

  /** Compares all pairs with the expansion as it is now. */
  void compare() {
    Arrays.fill(even, 0, size * width, 0);
    Arrays.fill(odd, 0, size * width, 0);
    for (int pair = 0; pair < size; pair++) {
      int first = pair * axes * stride;
      expansion.addAt(polynomials, first, stride, even, odd, pair * width);
      double x = singleReach;
      double cubic = x * (x * x - 3) / Math.sqrt(6);
      double quartic = x * x * (x * x - 3) / Math.sqrt(24);
      boolean scaled = singleAxis >= 0 && pair == 0;
      subtract(pair, scaled ? 1 / quartic : 1, scaled ? 1 / cubic : 1);
    }
  }

  private void subtract(int pair, double evenScale, double oddScale) {
    for (int c = 0; c < width; c++) {
      double plus = values[2 * pair * width + c];
      double minus = values[(2 * pair + 1) * width + c];
      int at = pair * width + c;
      even[at] = evenScale * ((plus + minus) / 2 - even[at]);
      odd[at] = oddScale * ((plus - minus) / 2 - odd[at]);
    }
  }

  /** What is missed of the even part, a block for each pair. */
  double[] even() {
    return even;
  }

  /** What is missed of the odd part, likewise. */
  double[] odd() {
    return odd;
  }
}

package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Covariance;

/**
 * How far the moments of an expansion may be from the truth; {@link ToleranceMatching} has the reasoning. <i>Confined to
 * one thread</i>; allocates only when built.
 */
final class ErrorEstimate {
  /** What of a missed even part may move the mean: the more, the more the function bends along an axis. */
  private static final double LEAST_EVEN_SHARE = 0.15;

  private static final double MOST_EVEN_SHARE = 0.5;

  /** Probes see what is missed at a few places only. Chosen on test functions, as are the others. */
  private static final double CAUTION = 1.38;

  /** What follows the last terms of a series that converges, in squares of them. */
  private static final double TAIL = 2;

  /** A cubic term c_3 changes the slope at the centre by sqrt(3/2) c_3: its square. */
  private static final double SLOPE_OF_CUBIC = 1.5;

  private final NestedExpansion expansion;
  private final ExpansionNorms norms;
  private final ProbePairs probes;
  private final int axes;
  private final int width;
  private final double[] slopes;
  private boolean slopesKnown;

  ErrorEstimate(
      NestedExpansion expansion, ExpansionNorms norms, ProbePairs probes, int axes, int width) {
    this.expansion = expansion;
    this.norms = norms;
    this.probes = probes;
    this.axes = axes;
    this.width = width;
    this.slopes = new double[axes * width];
  }

  /** The array for what the expansion misses of the slopes at the centre, a block for each axis. */
  double[] changeSlopes() {
    return slopes;
  }

  /**
   * Estimates the largest error of mean, covariance and cross-covariance.
   *
   * @param noise or null
   * @param rounding for each component a variance of which nothing smaller is seen
   * @param withSlopes whether what is missed of the slopes is known
   */
  double estimate(Covariance noise, Use use, double[] rounding, boolean withSlopes) {
    slopesKnown = withSlopes;
    probes.compare();
    norms.begin(noise, use);
    for (int pair = 0; pair < probes.size(); pair++) {
      norms.include(probes.even(), pair * width);
      norms.include(probes.odd(), pair * width);
    }
    for (int axis = 0; slopesKnown && axis < axes; axis++) {
      norms.include(slopes, axis * width);
    }
    norms.end(rounding);
    return probes.size() == 0 ? Double.POSITIVE_INFINITY : combine();
  }

  private double combine() {
    double even = largest(probes.even());
    double odd = Math.max(largest(probes.odd()), cubics());
    double first = Math.hypot(evenShare() * even, odd);
    double second = even * even + odd * odd + aliasShare() * Math.sqrt(norms.bent()) * even;
    return CAUTION * Math.max(Math.max(first, second), pairs()) + tails();
  }

  private double largest(double[] missed) {
    double largest = 0;
    for (int pair = 0; pair < probes.size(); pair++) {
      largest = Math.max(largest, norms.square(missed, pair * width));
    }
    return Math.sqrt(largest);
  }

  private double cubics() {
    double sum = 0;
    for (int axis = 0; slopesKnown && axis < axes; axis++) {
      sum += norms.square(slopes, axis * width);
    }
    return Math.sqrt(sum / SLOPE_OF_CUBIC);
  }

  /** How many axes bend by more than the least share. */
  int bendingAxes() {
    int count = 0;
    for (int axis = 0; axis < axes; axis++) {
      count += norms.bend(axis) > LEAST_EVEN_SHARE ? 1 : 0;
    }
    return count;
  }

  private double evenShare() {
    double bend = LEAST_EVEN_SHARE;
    for (int axis = 0; axis < axes; axis++) {
      bend = Math.max(bend, norms.bend(axis));
    }
    return Math.min(MOST_EVEN_SHARE, bend);
  }

  /** What of a missed even part the nodes take for known terms: products of three axes and more they do not. */
  private double aliasShare() {
    return Math.min(1, 2.0 / axes);
  }

  /** Pairs of axes not looked at yet, both of which bend. */
  private double pairs() {
    LevelSet set = expansion.set();
    double sum = 0;
    for (int axis = 1; axis < axes; axis++) {
      for (int other = 0; other < axis; other++) {
        int member = set.above(0, other);
        if (member >= 0 && set.above(member, axis) < 0) {
          sum += norms.pair(axis, other);
        }
      }
    }
    return sum;
  }

  /**
   * What follows the last terms along axes from the second level on: in covariances their squares, in means what nodes
   * take for the mean of degrees twice as high, where the series does not converge.
   */
  private double tails() {
    LevelSet set = expansion.set();
    double sum = 0;
    double taken = 0;
    for (int member = 1; member < set.size(); member++) {
      for (int axis = 0; axis < axes; axis++) {
        if (set.level(member, axis) >= 2 && set.above(member, axis) < 0) {
          double edge = norms.edge(member, axis);
          sum += edge;
          int pairsOfDegrees = (expansion.projection().degree(set.level(member, axis)) + 1) / 2;
          double left = Math.min(1, Math.pow(norms.decay(member, axis), pairsOfDegrees));
          taken += edge * left * left;
        }
      }
    }
    return TAIL * sum + Math.sqrt(taken);
  }
}

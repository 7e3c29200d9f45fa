package dev.estimation.core.points;

import java.util.SplittableRandom;

/**
 * Points 1 to N of a sequence that fills the unit cube evenly, turned to N(0, I): xi = Phi^-1(x) axis by
 * axis, of weight 1 / N. Point 0 of both sequences is the origin, which has no image, and is left out.
 *
 * <p>For smooth functions of few inputs the error falls nearly as 1 / N, where that of random draws falls
 * as 1 / sqrt N. Best is N = 2^k - 1 for Sobol. Plain Halton points fill poorly in more than some ten
 * dimensions, where its large bases rise together.
 *
 * <p>A sequence has no chance in it, so there is no standard error. <i>Randomly shifted</i>: each replicate
 * is the same N points moved by one uniform random vector modulo 1; replicates are independent and without
 * bias, and give standard errors. One shift alone gives none. <i>Standardised</i> points (shifted and scaled
 * to mean 0 and covariance I) give none either, are exact for affine functions, and are what filters want.
 *
 * <p>The same bits on every Java version. Cost: N + 1 evaluations, or R N + 1. <i>Immutable.</i> Source:
 * Sobol 1967, <i>On the distribution of points in a cube and the approximate evaluation of integrals</i>,
 * with the direction numbers of Joe and Kuo 2008 (new-joe-kuo-6), as commons-math3 has them; Halton 1960,
 * <i>On the efficiency of certain quasi-random sequences of points</i>, Numerische Mathematik 2; shifts:
 * Cranley and Patterson 1976, <i>Randomization of number theoretic methods for multiple integration</i>,
 * SIAM Journal on Numerical Analysis 13(6).
 */
public final class QuasiRandomRule implements PointRule {
  private final CubeSequence sequence;
  private final int count;
  private final int shifts;
  private final long seed;
  private final boolean standardised;

  private QuasiRandomRule(
      CubeSequence sequence, int count, int shifts, long seed, boolean standardised) {
    Draws.check("a " + sequence.title() + " rule", count, Math.max(1, shifts));
    this.sequence = sequence;
    this.count = count;
    this.shifts = shifts;
    this.seed = seed;
    this.standardised = standardised;
  }

  /**
   * The Sobol sequence, in up to 1000 dimensions.
   *
   * @param count N, from 2 to {@link UnitPoints#LARGEST_SIZE}
   * @return the rule
   */
  public static QuasiRandomRule sobol(int count) {
    return new QuasiRandomRule(CubeSequence.SOBOL, count, 0, 0, false);
  }

  /**
   * The plain Halton sequence, its bases the first primes, in up to 40 dimensions.
   *
   * @param count N, from 2 to {@link UnitPoints#LARGEST_SIZE}
   * @return the rule
   */
  public static QuasiRandomRule halton(int count) {
    return new QuasiRandomRule(CubeSequence.HALTON, count, 0, 0, false);
  }

  /**
   * {@return the same sequence, randomly shifted}
   *
   * @param replicates R, 16 or more with R N at most {@link UnitPoints#LARGEST_SIZE}; or 1, without
   *     standard errors
   * @param shiftSeed of a {@code SplittableRandom}
   */
  public QuasiRandomRule shifted(int replicates, long shiftSeed) {
    if (replicates < 1) {
      throw new IllegalArgumentException("shifts must be 1 or more, got " + replicates);
    }
    return new QuasiRandomRule(sequence, count, replicates, shiftSeed, standardised);
  }

  /** {@return the same points, shifted and scaled to mean 0 and covariance I all together} */
  public QuasiRandomRule standardised() {
    return new QuasiRandomRule(sequence, count, shifts, seed, true);
  }

  @Override
  public UnitPoints points(int dimension) {
    double[][] cube = sequence.points(count, dimension);
    SplittableRandom random = new SplittableRandom(seed);
    int replicates = Math.max(1, shifts);
    double[][] draws = new double[replicates * count][dimension];
    double[] shift = new double[dimension];
    for (int first = 0; first < draws.length; first += count) {
      for (int axis = 0; axis < dimension && shifts > 0; axis++) {
        shift[axis] = random.nextDouble();
      }
      for (int i = 0; i < count; i++) {
        fill(draws[first + i], cube[i], shift);
      }
    }
    return standardised
        ? Draws.standardised(dimension, draws)
        : UnitPoints.sample(dimension, draws, replicates);
  }

  /** Phi^-1 of x + shift modulo 1. */
  private static void fill(double[] point, double[] cube, double[] shift) {
    for (int axis = 0; axis < point.length; axis++) {
      double moved = cube[axis] + shift[axis];
      point[axis] = UnitNormal.quantile(moved < 1 ? moved : moved - 1);
    }
  }
}

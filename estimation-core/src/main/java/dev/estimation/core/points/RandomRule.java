package dev.estimation.core.points;

import java.util.SplittableRandom;
import java.util.function.Supplier;
import java.util.random.RandomGenerator;

/**
 * Random draws of N(0, I), of equal weight 1 / N, drawn once when the rule's points are made.
 *
 * <p><i>Independent</i> draws: moments by them have standard errors, which shrink as 1 / sqrt N (see
 * {@code SampledWorkspace}); no moment is exact, and a filter with very accurate measurements may find
 * its covariances indefinite. <i>Antithetic</i> draws come in pairs xi, -xi: odd moments are exact, so
 * that errors of the mean fall where the function is nearly affine; the variance rises, to that of half as
 * many draws, where the function is even. The pairs are independent of each other and are the replicates
 * from which standard errors come.
 *
 * <p><i>Standardised</i> draws are shifted and scaled to mean 0 and covariance I exactly, as the points of
 * all other rules are: affine functions are exact and the error is smaller, but the draws are no longer
 * independent and give no standard error. Filters want these. Antithetic ones stay antithetic and are exact
 * to degree 3.
 *
 * <p>The same seed gives the same points on every Java version: normal numbers are made from {@code
 * nextDouble} by the polar method (Marsaglia and Bray 1964) with {@code StrictMath}. Standardising costs
 * about N n^2 operations, once. <i>Immutable</i>, provided that the given supplier makes generators in
 * equal states. Source of antithetic draws: Hammersley and Morton 1956, <i>A new Monte Carlo technique:
 * antithetic variates</i>, Proceedings of the Cambridge Philosophical Society 52.
 */
public final class RandomRule implements PointRule {
  private final int replicates;
  private final boolean antithetic;
  private final Supplier<? extends RandomGenerator> generators;
  private final boolean standardised;

  private RandomRule(
      int replicates,
      boolean antithetic,
      Supplier<? extends RandomGenerator> generators,
      boolean standardised) {
    this.replicates = replicates;
    this.antithetic = antithetic;
    this.generators = generators;
    this.standardised = standardised;
  }

  /**
   * Independent draws from a seed.
   *
   * @param count N, from 2 to {@link UnitPoints#LARGEST_SIZE}
   * @param seed of a {@code SplittableRandom}
   * @return the rule
   */
  public static RandomRule independent(int count, long seed) {
    return independent(count, () -> new SplittableRandom(seed));
  }

  /**
   * Independent draws from a given kind of generator.
   *
   * @param count N, from 2 to {@link UnitPoints#LARGEST_SIZE}
   * @param generators makes a new generator, always in the same state
   * @return the rule
   */
  public static RandomRule independent(int count, Supplier<? extends RandomGenerator> generators) {
    if (count < 2) {
      throw new IllegalArgumentException("a sample must have 2 draws or more, got " + count);
    }
    UnitPoints.refuseAbove("a sample", count);
    return new RandomRule(count, false, generators, false);
  }

  /**
   * Antithetic draws from a seed.
   *
   * @param pairs N / 2, from 16 to half of {@link UnitPoints#LARGEST_SIZE}
   * @param seed of a {@code SplittableRandom}
   * @return the rule
   */
  public static RandomRule antithetic(int pairs, long seed) {
    return antithetic(pairs, () -> new SplittableRandom(seed));
  }

  /**
   * Antithetic draws from a given kind of generator.
   *
   * @param pairs N / 2, from 16 to half of {@link UnitPoints#LARGEST_SIZE}
   * @param generators makes a new generator, always in the same state
   * @return the rule
   */
  public static RandomRule antithetic(int pairs, Supplier<? extends RandomGenerator> generators) {
    if (pairs < Draws.FEWEST_REPLICATES) {
      throw new IllegalArgumentException("an antithetic sample must have " + Draws.FEWEST_REPLICATES
          + " pairs or more, got " + pairs);
    }
    UnitPoints.refuseAbove("an antithetic sample", 2.0 * pairs);
    return new RandomRule(pairs, true, generators, false);
  }

  /** {@return the same draws, shifted and scaled to mean 0 and covariance I} */
  public RandomRule standardised() {
    return new RandomRule(replicates, antithetic, generators, true);
  }

  @Override
  public UnitPoints points(int dimension) {
    double[][] draws = draw(dimension);
    if (!standardised) {
      return UnitPoints.sample(dimension, draws, replicates);
    }
    UnitPoints points = Draws.standardised(dimension, draws);
    return antithetic ? points.exactTo(3) : points;
  }

  private double[][] draw(int dimension) {
    RandomGenerator random = generators.get();
    double[] pair = new double[2];
    int step = antithetic ? 2 : 1;
    double[][] draws = new double[step * replicates][dimension];
    int next = 0;
    for (int i = 0; i < draws.length; i += step) {
      for (int axis = 0; axis < dimension; axis++) {
        if (next % 2 == 0) {
          fillNormalPair(random, pair);
        }
        draws[i][axis] = pair[next++ % 2];
        if (antithetic) {
          draws[i + 1][axis] = -draws[i][axis];
        }
      }
    }
    return draws;
  }

  private static void fillNormalPair(RandomGenerator random, double[] pair) {
    double x;
    double y;
    double square;
    do {
      x = 2 * random.nextDouble() - 1;
      y = 2 * random.nextDouble() - 1;
      square = x * x + y * y;
    } while (square >= 1 || square == 0);
    double factor = Math.sqrt(-2 * StrictMath.log(square) / square);
    pair[0] = x * factor;
    pair[1] = y * factor;
  }
}

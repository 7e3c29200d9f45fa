package dev.estimation.core.points;

import dev.estimation.core.internal.LowerFactor;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.function.Supplier;
import java.util.random.RandomGenerator;
import org.ejml.data.DMatrixRMaj;

/**
 * Random draws of N(0, I), of equal weight 1 / N, drawn once when the rule's points are made.
 *
 * <p><i>Independent</i> draws: moments by them have standard errors, which shrink as 1 / sqrt N (see
 * {@code SampledWorkspace}); no moment is exact, and a filter with very accurate measurements may find
 * its covariances indefinite. <i>Standardised</i> draws are shifted and scaled to mean 0 and covariance
 * I exactly, as all other rules are: affine functions are exact and the error is smaller, but the draws
 * are no longer independent and have no simple standard error. Filters want these.
 *
 * <p>The same seed gives the same points on every Java version: normal numbers are made from {@code
 * nextDouble} by the polar method (Marsaglia and Bray 1964) with {@code StrictMath}. Standardising costs
 * about N n^2 operations, once. <i>Immutable</i>, provided that the given supplier makes generators in
 * equal states.
 */
public final class RandomRule implements PointRule {
  private final int count;
  private final Supplier<? extends RandomGenerator> generators;
  private final boolean standardised;

  private RandomRule(
      int count, Supplier<? extends RandomGenerator> generators, boolean standardised) {
    if (count < 2) {
      throw new IllegalArgumentException("a sample must have 2 draws or more, got " + count);
    }
    UnitPoints.refuseAbove("a sample", count);
    this.count = count;
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
    return new RandomRule(count, generators, false);
  }

  /** {@return the same draws, shifted and scaled to mean 0 and covariance I} */
  public RandomRule standardised() {
    return new RandomRule(count, generators, true);
  }

  @Override
  public UnitPoints points(int dimension) {
    double[][] draws = draw(dimension);
    if (!standardised) {
      return UnitPoints.sample(dimension, draws);
    }
    if (count <= dimension) {
      throw new IllegalArgumentException("standardised draws must be more than the dimensions, got "
          + count + " draws in " + dimension + " dimensions");
    }
    standardise(draws, dimension);
    double[] weights = new double[count];
    Arrays.fill(weights, 1.0 / count);
    return UnitPoints.of(dimension, 0, 0, draws, weights);
  }

  private double[][] draw(int dimension) {
    RandomGenerator random = generators.get();
    double[] pair = new double[2];
    double[][] draws = new double[count][dimension];
    int next = 0;
    for (double[] point : draws) {
      for (int axis = 0; axis < dimension; axis++) {
        if (next % 2 == 0) {
          fillNormalPair(random, pair);
        }
        point[axis] = pair[next++ % 2];
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

  /** Subtracts the mean and solves against the lower factor of the covariance. */
  private static void standardise(double[][] draws, int dimension) {
    double[] mean = new double[dimension];
    for (double[] point : draws) {
      for (int i = 0; i < dimension; i++) {
        mean[i] += point[i] / draws.length;
      }
    }
    DMatrixRMaj covariance = new DMatrixRMaj(dimension, dimension);
    for (double[] point : draws) {
      for (int i = 0; i < dimension; i++) {
        point[i] -= mean[i];
        for (int j = 0; j <= i; j++) {
          covariance.data[i * dimension + j] += point[i] * point[j] / draws.length;
        }
      }
    }
    LowerFactor factor = new LowerFactor(dimension);
    if (!factor.factorDefinite(covariance)) {
      throw new IllegalArgumentException(
          "the generator's draws have no definite covariance: " + factor.failure());
    }
    for (double[] point : draws) {
      factor.solveLower(point);
    }
  }
}

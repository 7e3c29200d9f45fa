package dev.estimation.core.points;

import java.util.SplittableRandom;

/**
 * Latin hypercubes: on every axis, each of N strata of equal probability holds one point, of weight 1 /
 * N.
 *
 * <p>Point i has the coordinate Phi^-1((pi(i) + u) / N) along an axis, with pi a random permutation of 0
 * to N - 1 and u uniform in [0, 1), both anew for each axis. What a function has of sums over single axes
 * is integrated with an error of order N^(-3/2), what is left as by independent draws; so little is won
 * where inputs work together.
 *
 * <p>The points of one hypercube depend on each other, so that their scatter says nothing of the error:
 * one alone gives no standard error. {@link #replicates} makes several independent ones, which do.
 * <i>Standardised</i> points (shifted and scaled to mean 0 and covariance I) give none either, are exact
 * for affine functions, and are what filters want.
 *
 * <p>The same seed gives the same points on every Java version. Cost: N + 1 evaluations a hypercube.
 * <i>Immutable.</i> Source: McKay, Beckman and Conover 1979, <i>A comparison of three methods for
 * selecting values of input variables in the analysis of output from a computer code</i>, Technometrics
 * 21(2); order of the error: Stein 1987, Technometrics 29(2), from memory.
 */
public final class LatinHypercubeRule implements PointRule {
  private final int strata;
  private final int replicates;
  private final long seed;
  private final boolean standardised;

  private LatinHypercubeRule(int strata, int replicates, long seed, boolean standardised) {
    Draws.check("a Latin hypercube", strata, replicates);
    this.strata = strata;
    this.replicates = replicates;
    this.seed = seed;
    this.standardised = standardised;
  }

  /**
   * One hypercube, without standard errors.
   *
   * @param strata N, from 2 to {@link UnitPoints#LARGEST_SIZE}
   * @param seed of a {@code SplittableRandom}
   * @return the rule
   */
  public static LatinHypercubeRule of(int strata, long seed) {
    return new LatinHypercubeRule(strata, 1, seed, false);
  }

  /**
   * {@return as many independent hypercubes of this size, with standard errors}
   *
   * @param count R, 16 or more with R N at most {@link UnitPoints#LARGEST_SIZE}; or 1
   */
  public LatinHypercubeRule replicates(int count) {
    return new LatinHypercubeRule(strata, count, seed, standardised);
  }

  /** {@return the same points, shifted and scaled to mean 0 and covariance I all together} */
  public LatinHypercubeRule standardised() {
    return new LatinHypercubeRule(strata, replicates, seed, true);
  }

  @Override
  public UnitPoints points(int dimension) {
    SplittableRandom random = new SplittableRandom(seed);
    double[][] draws = new double[replicates * strata][dimension];
    for (int first = 0; first < draws.length; first += strata) {
      for (int axis = 0; axis < dimension; axis++) {
        fillAxis(random, draws, first, axis);
      }
    }
    return standardised
        ? Draws.standardised(dimension, draws)
        : UnitPoints.sample(dimension, draws, replicates);
  }

  private void fillAxis(SplittableRandom random, double[][] draws, int first, int axis) {
    int[] order = permutation(random);
    for (int i = 0; i < strata; i++) {
      draws[first + i][axis] = UnitNormal.quantile((order[i] + random.nextDouble()) / strata);
    }
  }

  /** By exchanges from the end (Fisher and Yates); by nextDouble, whose bits no Java version changes. */
  private int[] permutation(SplittableRandom random) {
    int[] order = new int[strata];
    for (int i = 0; i < strata; i++) {
      order[i] = i;
    }
    for (int i = strata - 1; i > 0; i--) {
      int other = (int) (random.nextDouble() * (i + 1));
      int kept = order[i];
      order[i] = order[other];
      order[other] = kept;
    }
    return order;
  }
}

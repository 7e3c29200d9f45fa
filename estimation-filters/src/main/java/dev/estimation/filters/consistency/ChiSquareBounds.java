package dev.estimation.filters.consistency;

import org.apache.commons.math3.distribution.ChiSquaredDistribution;
import org.apache.commons.math3.special.Gamma;

/**
 * Bounds that a normalised squared error, or the average of many, keeps with a given probability if
 * the covariances are honest.
 *
 * <p>A normalised squared error of d components is chi-square with d degrees of freedom; the sum of N
 * independent ones has N d. Errors of successive steps of one track are <i>not</i> independent: the
 * average over a track may leave the bounds of {@link #ofAverage} more often than stated. Accuracy of
 * quantiles: 1e-12 relative for probabilities from 1e-3 to 0.999, falling to 1e-5 at 1 - 1e-12. <i>Immutable.</i> Source: Bar-Shalom, Li and Kirubarajan 2001,
 * <i>Estimation with Applications to Tracking and Navigation</i>, section 5.4.
 */
public final class ChiSquareBounds {
  private static final double SMALLEST = 1e-12;
  private static final double SERIES_LIMIT = 1e-4;

  private final double lower;
  private final double upper;

  private ChiSquareBounds(double lower, double upper) {
    this.lower = lower;
    this.upper = upper;
  }

  /**
   * The two-sided bounds of one normalised squared error.
   *
   * @param probability of staying inside, from 1e-12 to 1 - 1e-12; each side is left with half the rest
   * @param degreesOfFreedom 1 or more
   * @return the bounds
   */
  public static ChiSquareBounds twoSided(double probability, int degreesOfFreedom) {
    return ofAverage(probability, degreesOfFreedom, 1);
  }

  /**
   * The two-sided bounds of the average of independent normalised squared errors.
   *
   * @param probability of staying inside, from 1e-12 to 1 - 1e-12
   * @param degreesOfFreedom of each, 1 or more
   * @param count how many are averaged, 1 or more
   * @return the bounds
   */
  public static ChiSquareBounds ofAverage(double probability, int degreesOfFreedom, int count) {
    if (degreesOfFreedom < 1 || count < 1) {
      throw new IllegalArgumentException("degrees of freedom and count must be 1 or more, got "
          + degreesOfFreedom + " and " + count);
    }
    requireProbability(probability);
    double degrees = (double) degreesOfFreedom * count;
    return new ChiSquareBounds(
        quantile((1 - probability) / 2, degrees) / count,
        quantile((1 + probability) / 2, degrees) / count);
  }

  /**
   * The limit that a chi-square variable stays below with the given probability: the gate of a
   * normalised innovation squared.
   *
   * @param probability from 1e-12 to 1 - 1e-12
   * @param degreesOfFreedom 1 or more
   * @return the limit
   */
  public static double upperLimit(double probability, int degreesOfFreedom) {
    if (degreesOfFreedom < 1) {
      throw new IllegalArgumentException(
          "degrees of freedom must be 1 or more, got " + degreesOfFreedom);
    }
    requireProbability(probability);
    return quantile(probability, degreesOfFreedom);
  }

  private static void requireProbability(double probability) {
    if (!(probability >= SMALLEST && probability <= 1 - SMALLEST)) {
      throw new IllegalArgumentException(
          "probability must be in [" + SMALLEST + ", 1 - " + SMALLEST + "], got " + probability);
    }
  }

  /**
   * The library's inverse is right to an absolute error only: Newton steps make that relative, from the
   * first term of the series p = (x/2)^(d/2) / Gamma(d/2 + 1) where x is so small that it is lost.
   */
  private static double quantile(double probability, double degrees) {
    ChiSquaredDistribution distribution = new ChiSquaredDistribution(null, degrees);
    double half = degrees / 2;
    double series = 2 * Math.exp((Math.log(probability) + Gamma.logGamma(half + 1)) / half);
    double x =
        series < SERIES_LIMIT ? series : distribution.inverseCumulativeProbability(probability);
    for (int i = 0; i < 4; i++) {
      double density = distribution.density(x);
      double next = x - (distribution.cumulativeProbability(x) - probability) / density;
      if (!(next > x / 2 && next < 2 * x)) {
        break;
      }
      x = next;
    }
    return x;
  }

  /** {@return the lower bound} */
  public double lower() {
    return lower;
  }

  /** {@return the upper bound} */
  public double upper() {
    return upper;
  }

  /**
   * {@return whether a value lies inside, bounds included; NaN does not}
   *
   * @param value a normalised squared error
   */
  public boolean contains(double value) {
    return value >= lower && value <= upper;
  }
}

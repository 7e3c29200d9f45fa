package dev.estimation.core.accuracy;

import java.util.Arrays;
import org.apache.commons.math3.distribution.BinomialDistribution;

/**
 * Quantiles of a component's difference from the mean, from N samples; of a real component itself once its mean
 * is added.
 *
 * <p>The p-quantile is the order statistic that at least p N samples do not exceed. How many samples lie below the
 * true one is binomial, for any continuous distribution; its errors follow from that. The mean is taken for
 * known: for the component itself, mean added, nothing is approximate in the bounds. <i>Immutable.</i> Source: David and
 * Nagaraja 2003, <i>Order Statistics</i>, 3rd ed., section 7.1 (from memory).
 */
public final class DeviationQuantiles {
  private final double[] sorted;

  DeviationQuantiles(double[] deviations) {
    this.sorted = deviations.clone();
    Arrays.sort(sorted);
  }

  /**
   * A quantile.
   *
   * @param probability p, above 0 and below 1
   * @return in the unit of the component
   */
  public double value(double probability) {
    check("probability", probability);
    return ErrorQuantiles.ofSorted(sorted, probability);
  }

  /**
   * Half the distance of the samples whose ranks lie one standard deviation of the binomial, sqrt(N p (1 - p)), below
   * and above. Wants N p and N (1 - p) of 10 or more.
   *
   * @param probability p, above 0 and below 1
   * @return in the unit of the component
   */
  public double standardError(double probability) {
    check("probability", probability);
    double rank = probability * sorted.length;
    double deviation = Math.sqrt(rank * (1 - probability));
    int low = (int) Math.max(0, Math.round(rank - deviation) - 1);
    int high = (int) Math.min(sorted.length - 1, Math.round(rank + deviation));
    return (sorted[high] - sorted[low]) / 2;
  }

  /**
   * Bounds that hold the true quantile with at least the given confidence. Infinite where the samples do not reach.
   *
   * @param probability p, above 0 and below 1
   * @param confidence above 0 and below 1
   * @return lower and upper bound
   */
  public double[] bounds(double probability, double confidence) {
    check("probability", probability);
    check("confidence", confidence);
    BinomialDistribution below = new BinomialDistribution(null, sorted.length, probability);
    int low = below.inverseCumulativeProbability((1 - confidence) / 2);
    int high = below.inverseCumulativeProbability((1 + confidence) / 2) + 1;
    return new double[] {
      low == 0 ? Double.NEGATIVE_INFINITY : sorted[low - 1],
      high > sorted.length ? Double.POSITIVE_INFINITY : sorted[high - 1],
    };
  }

  private static void check(String what, double value) {
    if (!(value > 0 && value < 1)) {
      throw new IllegalArgumentException(
          what + " must be above 0 and below 1, got " + value + " (quantiles)");
    }
  }
}

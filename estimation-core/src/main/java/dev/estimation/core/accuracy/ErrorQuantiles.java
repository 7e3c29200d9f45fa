package dev.estimation.core.accuracy;

import java.util.Arrays;
import java.util.Locale;

/**
 * An error over operating points: order statistics. With N points, the p-quantile is the smallest error that at
 * least p N of them do not exceed.
 *
 * @param median p = 0.5
 * @param most p = 0.99; the worst for less than 100 points
 * @param worst the largest
 */
public record ErrorQuantiles(double median, double most, double worst) {
  static ErrorQuantiles of(double[] errors) {
    return new ErrorQuantiles(quantile(errors, 0.5), quantile(errors, 0.99), quantile(errors, 1));
  }

  /** NaN counts as the largest. */
  static double quantile(double[] errors, double share) {
    double[] sorted = errors.clone();
    Arrays.sort(sorted);
    return ofSorted(sorted, share);
  }

  /** The smallest number that at least a share of all do not exceed. */
  static double ofSorted(double[] sorted, double share) {
    // 0.07 x 100 is a little more than 7.
    int count = (int) Math.ceil(share * sorted.length * (1 - 1e-12));
    return sorted[Math.max(1, count) - 1];
  }

  @Override
  public String toString() {
    return String.format(Locale.ROOT, "%8.1e %8.1e %8.1e", median, most, worst);
  }
}

package dev.estimation.benchmarks.weigh;

import java.util.Arrays;

/**
 * Order statistics: of N numbers, the p-quantile is the smallest that at least p N of them do not exceed.
 *
 * @param median p = 0.5
 * @param most p = 0.9
 * @param nearlyAll p = 0.99; the largest for less than 100 numbers
 * @param largest p = 1
 */
public record Quantiles(double median, double most, double nearlyAll, double largest) {
  static Quantiles of(double[] numbers) {
    double[] sorted = numbers.clone();
    Arrays.sort(sorted);
    return new Quantiles(at(sorted, 0.5), at(sorted, 0.9), at(sorted, 0.99), at(sorted, 1));
  }

  private static double at(double[] sorted, double share) {
    if (sorted.length == 0) {
      return Double.NaN;
    }
    // 0.07 x 100 is a little more than 7.
    int count = (int) Math.ceil(share * sorted.length * (1 - 1e-12));
    return sorted[Math.max(1, count) - 1];
  }
}

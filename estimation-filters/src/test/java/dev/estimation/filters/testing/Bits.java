package dev.estimation.filters.testing;

import dev.estimation.filters.filter.Estimate;

/** The exact bits of an estimate, for checks that nothing at all has changed. */
public final class Bits {
  private Bits() {}

  /** Time, mean and covariance as raw bits. */
  public static long[] of(Estimate estimate, int dimension) {
    int storage = estimate.space().storage();
    long[] bits = new long[1 + storage + dimension * dimension];
    int next = 0;
    bits[next++] = Double.doubleToRawLongBits(estimate.time());
    for (int i = 0; i < storage; i++) {
      bits[next++] = Double.doubleToRawLongBits(estimate.mean(i));
    }
    for (int i = 0; i < dimension; i++) {
      for (int j = 0; j < dimension; j++) {
        bits[next++] = Double.doubleToRawLongBits(estimate.covariance(i, j));
      }
    }
    return bits;
  }
}

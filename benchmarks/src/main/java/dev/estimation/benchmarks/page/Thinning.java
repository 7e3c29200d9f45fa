package dev.estimation.benchmarks.page;

import java.util.stream.IntStream;

/**
 * Which of many points are drawn: every so many, so that no more than a limit remain, the last one always.
 *
 * @param limit of points a series, 2 or more
 */
record Thinning(int limit) {
  private static final int MOST = 2000;
  private static final int FEWEST = 200;
  /** Numbers on a page; at about eight characters each it stays below ten million. */
  private static final int BUDGET = 1_100_000;

  /** {@return the limit for so many runs with so many numbers a step} */
  static Thinning of(int runs, int numbersPerStep) {
    long fair = BUDGET / ((long) Math.max(1, runs) * numbersPerStep);
    return new Thinning((int) Math.max(FEWEST, Math.min(MOST, fair)));
  }

  /** {@return 1 if all of so many points are drawn, 2 if every second one is} */
  int stride(int count) {
    return Math.max(1, (count + limit - 2) / (limit - 1));
  }

  /** {@return the indices of the points drawn} */
  IntStream of(int count) {
    int stride = stride(count);
    int regular = (count + stride - 1) / stride;
    boolean lastIsMissed = count > 0 && (count - 1) % stride != 0;
    IntStream chosen = IntStream.range(0, regular).map(i -> i * stride);
    return lastIsMissed ? IntStream.concat(chosen, IntStream.of(count - 1)) : chosen;
  }
}

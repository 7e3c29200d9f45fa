package dev.estimation.core.matching;

/** {@link UnscentedNarrowMatchingTest} over the whole input. */
class WholeInputUnscentedNarrowTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new UnscentedNarrowMatchingTest();
  }

  /** Rounding is multiplied by 2e6: a mean of 1e9 deviations would leave no digit. */
  @Override
  public double largestOffset() {
    return 1e6;
  }
}

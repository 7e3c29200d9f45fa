package dev.estimation.core.matching;

/** {@link UnscentedWideMatchingTest} over the whole input. */
class WholeInputUnscentedWideTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new UnscentedWideMatchingTest();
  }
}

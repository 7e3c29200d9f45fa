package dev.estimation.core.matching;

/** {@link CubatureFiveMatchingTest} over the whole input. */
class WholeInputCubatureFiveTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new CubatureFiveMatchingTest();
  }
}

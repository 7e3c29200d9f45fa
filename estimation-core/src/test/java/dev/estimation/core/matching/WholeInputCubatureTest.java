package dev.estimation.core.matching;

/** {@link CubatureMatchingTest} over the whole input. */
class WholeInputCubatureTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new CubatureMatchingTest();
  }
}

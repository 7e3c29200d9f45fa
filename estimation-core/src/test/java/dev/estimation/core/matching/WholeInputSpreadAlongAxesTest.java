package dev.estimation.core.matching;

/** {@link SpreadAlongAxesTest} over the whole input. */
class WholeInputSpreadAlongAxesTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new SpreadAlongAxesTest();
  }
}

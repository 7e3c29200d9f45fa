package dev.estimation.core.matching;

/** {@link SpreadFirstOrderTest} over the whole input. */
class WholeInputSpreadFirstOrderTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new SpreadFirstOrderTest();
  }
}

package dev.estimation.core.matching;

/** {@link SpreadSecondOrderTest} over the whole input. */
class WholeInputSpreadSecondOrderTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new SpreadSecondOrderTest();
  }
}

package dev.estimation.core.matching;

/** {@link McNameeStengerMatchingTest} over the whole input. */
class WholeInputMcNameeStengerTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new McNameeStengerMatchingTest();
  }
}

package dev.estimation.core.matching;

/** {@link LinearisationTest} over the whole input. */
class WholeInputLinearisationTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new LinearisationTest();
  }
}

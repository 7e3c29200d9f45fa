package dev.estimation.core.matching;

/** {@link SecondDifferenceLinearisationTest} over the whole input. */
class WholeInputSecondDifferenceLinearisationTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new SecondDifferenceLinearisationTest();
  }
}

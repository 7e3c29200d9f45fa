package dev.estimation.core.matching;

/** {@link SecondOrderLinearisationTest} over the whole input. */
class WholeInputSecondOrderLinearisationTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new SecondOrderLinearisationTest();
  }
}

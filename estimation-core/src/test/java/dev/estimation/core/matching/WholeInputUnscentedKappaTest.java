package dev.estimation.core.matching;

/** {@link UnscentedKappaMatchingTest} over the whole input. */
class WholeInputUnscentedKappaTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new UnscentedKappaMatchingTest();
  }
}

package dev.estimation.core.matching;

/** {@link GaussHermiteThreeMatchingTest} over the whole input. */
class WholeInputGaussHermiteThreeTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new GaussHermiteThreeMatchingTest();
  }
}

package dev.estimation.core.matching;

/** {@link SimplexMatchingTest} over the whole input. */
class WholeInputSimplexTest extends WholeInputContract {
  @Override
  MatchingUnderTest narrow() {
    return new SimplexMatchingTest();
  }
}

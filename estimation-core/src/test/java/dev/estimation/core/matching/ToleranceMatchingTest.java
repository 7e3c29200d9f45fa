package dev.estimation.core.matching;

/** Matching to a tolerance so wide that the first points do, for any function: what they cost is then known. */
class ToleranceMatchingTest extends MomentMatchingContract {
  @Override
  public MomentMatching matching(double... inputScales) {
    return ToleranceMatching.within(1e6);
  }

  @Override
  public int evaluations(int carried) {
    return carried == 1 ? 5 : 2 * carried + 3;
  }

  @Override
  public int jacobians(int carried) {
    return 1;
  }

  @Override
  public double spread(int carried) {
    return 1;
  }

  @Override
  public double amplification(int carried) {
    return 4;
  }
}

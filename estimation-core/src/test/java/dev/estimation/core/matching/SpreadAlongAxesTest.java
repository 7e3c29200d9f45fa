package dev.estimation.core.matching;

/** {@link SpreadLinearisation#secondOrderAlongAxes()}. */
class SpreadAlongAxesTest extends SpreadLinearisationContract {
  @Override
  public MomentMatching matching(double... inputScales) {
    return SpreadLinearisation.secondOrderAlongAxes();
  }

  @Override
  public int evaluations(int carried) {
    return 2 * carried + 1;
  }
}

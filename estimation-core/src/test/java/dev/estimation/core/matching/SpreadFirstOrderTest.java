package dev.estimation.core.matching;

/** {@link SpreadLinearisation#firstOrder()}. */
class SpreadFirstOrderTest extends SpreadLinearisationContract {
  @Override
  public MomentMatching matching(double... inputScales) {
    return SpreadLinearisation.firstOrder();
  }

  @Override
  public int evaluations(int carried) {
    return 2 * carried + 1;
  }
}

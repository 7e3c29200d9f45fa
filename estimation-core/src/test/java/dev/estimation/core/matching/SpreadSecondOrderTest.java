package dev.estimation.core.matching;

/** {@link SpreadLinearisation#secondOrder()}. */
class SpreadSecondOrderTest extends SpreadLinearisationContract {
  @Override
  public MomentMatching matching(double... inputScales) {
    return SpreadLinearisation.secondOrder();
  }

  @Override
  public int evaluations(int carried) {
    return 1 + carried + carried * carried;
  }
}

package dev.estimation.core.matching;

/** Second-order linearisation with analytic derivatives. */
class SecondOrderLinearisationTest extends MomentMatchingContract implements FrozenInputChecks {
  @Override
  public MomentMatching matching(double... inputScales) {
    return Linearisation.secondOrder();
  }

  @Override
  public int evaluations(int carried) {
    return 1;
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
    return 1;
  }
}

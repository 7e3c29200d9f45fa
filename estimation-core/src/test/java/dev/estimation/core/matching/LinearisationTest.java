package dev.estimation.core.matching;

/** First-order linearisation with analytic Jacobians. */
class LinearisationTest extends MomentMatchingContract implements FrozenInputChecks {
  @Override
  public MomentMatching matching(double... inputScales) {
    return Linearisation.firstOrder();
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

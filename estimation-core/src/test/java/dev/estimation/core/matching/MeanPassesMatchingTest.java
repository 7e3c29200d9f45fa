package dev.estimation.core.matching;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnscentedRule;

/** Three passes keep the whole contract, with a centre of some weight. */
class MeanPassesMatchingTest extends PointMatchingContract {
  @Override
  PointRule rule() {
    return UnscentedRule.scaled(1, 2, 1);
  }

  @Override
  public MomentMatching matching(double... inputScales) {
    return PointMatching.of(rule()).withMeanPasses(3);
  }
}

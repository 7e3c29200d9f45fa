package dev.estimation.benchmarks.agreement;

import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import java.util.List;

/**
 * A filter of the expected files that this library has, and how close it must come to them.
 *
 * @param name in the files
 * @param matching the same filter here
 * @param distanceLimit in standard deviations
 * @param scoreLimit relative; for the narrow spread, whose weights of 1e6 amplify rounding, ten
 *     times what was seen
 * @param logLikelihoodLimit absolute
 */
record ReferenceFilter(
    String name,
    MomentMatching matching,
    double distanceLimit,
    double scoreLimit,
    double logLikelihoodLimit) {
  static final ReferenceFilter LINEAR =
      new ReferenceFilter("ekf", Linearisation.firstOrder(), 1e-9, 1e-9, 1e-7);
  static final ReferenceFilter HERMITE =
      new ReferenceFilter("gh3", PointMatching.of(GaussHermiteRule.product(3)), 1e-9, 1e-9, 1e-7);

  static final List<ReferenceFilter> ALL = List.of(
      LINEAR,
      new ReferenceFilter(
          "ukf-a1", PointMatching.of(UnscentedRule.scaled(1, 2, 0)), 1e-9, 1e-9, 1e-7),
      new ReferenceFilter(
          "ukf-a1e-3", PointMatching.of(UnscentedRule.scaled(1e-3, 2, 0)), 1e-5, 1e-7, 1e-3),
      new ReferenceFilter(
          "ukf-k3-n",
          PointMatching.of(UnscentedRule.scaled(1, 0, (int n) -> 3 - n)),
          1e-9,
          1e-9,
          1e-7),
      new ReferenceFilter("ckf", PointMatching.of(CubatureRule.degreeThree()), 1e-9, 1e-9, 1e-7),
      HERMITE);
}

package dev.estimation.benchmarks.jmh;

import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.filter.FilterPlan;

/** The filters whose steps are timed, on the {@link TurnProblem}. */
final class StepMethod {
  private StepMethod() {}

  /**
   * A plan.
   *
   * @param method a name below
   * @param form {@code covariance} or {@code square-root}
   */
  static FilterPlan plan(String method, String form) {
    FilterPlan plan = FilterPlan.of(TurnProblem.motion(), matching(method));
    return switch (form) {
      case "covariance" -> plan;
      case "square-root" -> plan.inSquareRootForm();
      default -> throw new IllegalArgumentException("no form " + form);
    };
  }

  private static MomentMatching matching(String method) {
    MomentMatching unscented = PointMatching.of(UnscentedRule.scaled(1, 2, 0));
    MomentMatching hermite = PointMatching.of(GaussHermiteRule.product(3));
    return switch (method) {
      case "linear" -> Linearisation.firstOrder();
      case "unscented" -> unscented;
      case "unscented-whole" -> unscented.overWholeInput();
      case "cubature" -> PointMatching.of(CubatureRule.degreeThree());
      case "hermite3" -> hermite;
      case "hermite3-whole" -> hermite.overWholeInput();
      case "random10000-whole" ->
        PointMatching.of(RandomRule.independent(10_000, 11).standardised()).overWholeInput();
      default -> throw new IllegalArgumentException("no method " + method);
    };
  }
}

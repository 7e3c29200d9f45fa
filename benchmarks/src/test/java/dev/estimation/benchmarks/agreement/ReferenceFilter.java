package dev.estimation.benchmarks.agreement;

import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.filter.IteratedUpdate;
import java.util.List;

/**
 * A filter of the expected files that this library has, and how close it must come to them.
 *
 * @param name in the files
 * @param kind the same filter here
 * @param smoothed whether the expected track is smoothed
 * @param limits of the differences
 */
record ReferenceFilter(String name, FilterKind kind, boolean smoothed, Limits limits) {
  private static final FilterKind FIRST_ORDER = FilterKind.of(Linearisation.firstOrder());
  private static final FilterKind ITERATED = FilterKind.iterated(IteratedUpdate.undamped());
  private static final FilterKind UNSCENTED = points(UnscentedRule.scaled(1, 2, 0));
  private static final FilterKind NARROW = points(UnscentedRule.scaled(1e-3, 2, 0));
  private static final FilterKind FOURTH_MOMENT =
      points(UnscentedRule.scaled(1, 0, (int n) -> 3 - n));
  private static final FilterKind CUBATURE = points(CubatureRule.degreeThree());
  private static final FilterKind THREE_NODES = points(GaussHermiteRule.product(3));

  private static final Limits SAME = Limits.of(1e-9, 1e-9, 1e-7);

  /** Weights of 1e6 amplify rounding, in scores as in estimates. */
  private static final Limits AMPLIFIED = Limits.of(1e-5, 1e-5, 1e-3);

  static final ReferenceFilter LINEAR = filter("ekf", FIRST_ORDER, SAME);
  static final ReferenceFilter HERMITE = filter("gh3", THREE_NODES, SAME);

  /** Where nothing is ill-conditioned. */
  static final List<ReferenceFilter> ALL = List.of(
      LINEAR,
      filter("iekf", ITERATED, SAME),
      filter("ukf-a1", UNSCENTED, SAME),
      filter("ukf-a1e-3", NARROW, AMPLIFIED),
      filter("ukf-k3-n", FOURTH_MOMENT, SAME),
      filter("ckf", CUBATURE, SAME),
      HERMITE,
      smoother("ekf-rts", FIRST_ORDER, SAME),
      smoother("ukf-a1-rts", UNSCENTED, SAME));

  /**
   * First-order filters: 1e-5 as stated with the expected values, but where those are farther than that
   * from values of 50 digits ({@link ExactGnssTest}): 1.9e-4 filtered, 9.3e-5 smoothed, 7.7e-6 iterated,
   * and 1.3e-6 relative in the log-likelihood. This library is within 1e-8 of the exact ones.
   */
  private static Limits firstOrder(double distance) {
    return new Limits(distance, 1e-5, 0, 1e-4);
  }

  /**
   * Where variances of 1e10 meet noise of 1: two correct programs share fewer digits, the fewer the
   * larger the weights.
   */
  static final List<ReferenceFilter> FROM_A_FAR_START = List.of(
      filter("ekf", FIRST_ORDER, firstOrder(2e-4)),
      filter("iekf", ITERATED, firstOrder(1e-5)),
      filter("ukf-a1", UNSCENTED, Limits.wide(5e-2, 1e-4)),
      filter("ukf-a1e-3", NARROW, Limits.wide(0.1, 1e-4)),
      filter("ukf-k3-n", FOURTH_MOMENT, Limits.wide(5e-2, 1e-4)),
      filter("ckf", CUBATURE, Limits.wide(5e-2, 1e-4)),
      filter("gh3", THREE_NODES, Limits.wide(1e-3, 1e-4)),
      smoother("ekf-rts", FIRST_ORDER, firstOrder(1e-4)),
      smoother("ukf-a1-rts", UNSCENTED, Limits.wide(5e-2, 1e-4)));

  /** {@return the filter of that name} */
  static ReferenceFilter named(String name, List<ReferenceFilter> filters) {
    return filters.stream()
        .filter(filter -> filter.name().equals(name))
        .findAny()
        .orElseThrow(() -> new AssertionError("no filter here for the expected " + name));
  }

  /** {@return the same filter with factors of covariances in place of covariances} */
  ReferenceFilter inSquareRootForm() {
    return new ReferenceFilter(name, kind.inSquareRootForm(), smoothed, limits);
  }

  private static FilterKind points(PointRule rule) {
    return FilterKind.of(PointMatching.of(rule));
  }

  private static ReferenceFilter filter(String name, FilterKind kind, Limits limits) {
    return new ReferenceFilter(name, kind, false, limits);
  }

  private static ReferenceFilter smoother(String name, FilterKind kind, Limits limits) {
    return new ReferenceFilter(name, kind, true, limits);
  }
}

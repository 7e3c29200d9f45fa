package dev.estimation.benchmarks.replay;

import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.IteratedUpdate;
import dev.estimation.filters.model.Motion;
import java.util.Optional;

/**
 * A kind of filter, for any problem.
 *
 * @param matching how moments are carried; first-order linearisation if updates are iterated
 * @param iteration how updates are iterated; empty if they are not
 */
public record FilterKind(MomentMatching matching, Optional<IteratedUpdate> iteration) {
  /** {@return the filter of a matching} */
  public static FilterKind of(MomentMatching matching) {
    return new FilterKind(matching, Optional.empty());
  }

  /** {@return the filter that linearises its updates anew until they settle} */
  public static FilterKind iterated(IteratedUpdate iteration) {
    return new FilterKind(Linearisation.firstOrder(), Optional.of(iteration));
  }

  /**
   * {@return the same kind with points drawn over the whole state in updates too} An iterated filter
   * has no points and stays as it is.
   */
  public FilterKind overWholeState() {
    return iteration.isPresent() ? this : of(matching.overWholeInput());
  }

  FilterPlan plan(Motion motion) {
    return iteration
        .map(how -> FilterPlan.iteratedExtended(motion, how))
        .orElseGet(() -> FilterPlan.of(motion, matching));
  }
}

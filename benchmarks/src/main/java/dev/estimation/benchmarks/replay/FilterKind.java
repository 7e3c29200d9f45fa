package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Form;
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
 * @param form how covariances are carried
 */
public record FilterKind(MomentMatching matching, Optional<IteratedUpdate> iteration, Form form) {
  /** {@return the filter of a matching} */
  public static FilterKind of(MomentMatching matching) {
    return new FilterKind(matching, Optional.empty(), Form.COVARIANCE);
  }

  /** {@return the filter that linearises its updates anew until they settle} */
  public static FilterKind iterated(IteratedUpdate iteration) {
    return new FilterKind(Linearisation.firstOrder(), Optional.of(iteration), Form.COVARIANCE);
  }

  /**
   * {@return the same kind with points drawn over the whole state in updates too} An iterated filter
   * has no points and stays as it is.
   */
  public FilterKind overWholeState() {
    return iteration.isPresent()
        ? this
        : new FilterKind(matching.overWholeInput(), iteration, form);
  }

  /** {@return the same kind with factors of covariances in place of covariances} */
  public FilterKind inSquareRootForm() {
    return new FilterKind(matching, iteration, Form.SQUARE_ROOT);
  }

  FilterPlan plan(Motion motion) {
    FilterPlan plan = iteration
        .map(how -> FilterPlan.iteratedExtended(motion, how))
        .orElseGet(() -> FilterPlan.of(motion, matching));
    return form == Form.SQUARE_ROOT ? plan.inSquareRootForm() : plan;
  }
}

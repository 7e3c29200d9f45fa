package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.model.Motion;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One estimation problem, complete but for the kind of filter.
 *
 * @param motion how the state moves
 * @param gateProbability that an honest measurement passes, in (0, 1); empty for no gate
 * @param start what is known at the time of the first step, before its measurements
 * @param steps one or more; the first is not predicted to
 * @param truth of some components, where there is any
 */
public record Scenario(
    Motion motion,
    OptionalDouble gateProbability,
    Gaussian start,
    List<Step> steps,
    Optional<Truth> truth) {
  /** Keeps a copy of the steps. */
  public Scenario {
    steps = List.copyOf(steps);
    if (steps.isEmpty()) {
      throw new IllegalArgumentException("a scenario must have at least 1 step, got 0");
    }
  }

  FilterPlan plan(FilterKind kind) {
    FilterPlan plan = kind.plan(motion);
    return gateProbability.isPresent() ? plan.withGate(gateProbability.getAsDouble()) : plan;
  }

  /** Compares with the truth of this scenario, where there is any. */
  Optional<AccuracyTally> accuracy() {
    return truth.map(known -> new AccuracyTally(motion.stateSpace(), known));
  }

  double startTime() {
    return steps.get(0).time();
  }
}

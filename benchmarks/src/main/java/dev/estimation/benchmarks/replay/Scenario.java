package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.model.MotionModel;
import java.util.List;
import java.util.Optional;

/**
 * One estimation problem, complete but for the way of carrying moments.
 *
 * @param motion how the state moves
 * @param gateProbability that an honest measurement passes, in (0, 1)
 * @param start what is known at the time of the first step, before its measurements
 * @param steps one or more; the first is not predicted to
 * @param truth of some components, where there is any
 */
public record Scenario(
    MotionModel motion,
    double gateProbability,
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

  FilterPlan plan(MomentMatching matching) {
    return FilterPlan.of(motion, matching).withGate(gateProbability);
  }

  double startTime() {
    return steps.get(0).time();
  }
}

package dev.estimation.benchmarks.weigh;

import dev.estimation.benchmarks.replay.Scenario;

/**
 * Which operating points of a run are looked at.
 *
 * @param from first step, counted from 0
 * @param to last step; those that a run does not have are left out
 * @param every of the points of each function, every so-manieth; 0 for the smallest number that leaves at most 400
 */
public record Selection(int from, int to, int every) {
  /** Points of a function that are looked at unless it was said otherwise. */
  public static final int MOST = 400;

  /** All steps. */
  public static final Selection ALL = new Selection(0, Integer.MAX_VALUE, 0);

  /** Refuses what selects nothing. */
  public Selection {
    if (from < 0 || to < from || every < 0) {
      throw new IllegalArgumentException(
          "steps must be from 0 or more to that or more, every 0 or more, got " + from + ", " + to
              + ", " + every);
    }
  }

  boolean has(int step) {
    return from <= step && step <= to;
  }

  /** {@return the scenario without the steps after the last selected} */
  Scenario cut(Scenario scenario) {
    int size = scenario.steps().size();
    int kept = (int) Math.min(size, to + 1L);
    return new Scenario(
        scenario.motion(),
        scenario.gateProbability(),
        scenario.start(),
        scenario.steps().subList(0, kept),
        scenario.truth());
  }

  int interval(int calls) {
    return every > 0 ? every : Math.max(1, (calls + MOST - 1) / MOST);
  }
}

package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.StepStatus;

/** Counts updates that were skipped because their iteration did not settle. */
final class SkippedUpdates {
  private int count;
  private String first = "";

  void add(int step, double time) {
    if (count++ == 0) {
      first = "first at step " + step + ", t = " + time + " s";
    }
  }

  /** How many there were and where they began; empty if there were none. */
  String summary() {
    return count == 0
        ? ""
        : StepStatus.NOT_CONVERGED + " in " + count + (count == 1 ? " update, " : " updates, ")
            + first;
  }
}

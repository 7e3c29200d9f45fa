package dev.estimation.benchmarks.replay;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What came out of one run.
 *
 * @param status {@link #OK}, or the step that failed and why, or that updates did not converge
 * @param history the estimate of each step that was done
 * @param innovations what the measurements said; empty for a smoothed run, which has none
 * @param accuracy against truth, over the steps done
 * @param effort what it cost, a failed step included
 * @param stepsBelowTolerance steps done with a prediction or an update whose moments are not within the tolerance asked for
 */
public record RunResult(
    String status,
    List<Snapshot> history,
    Optional<Innovations> innovations,
    Accuracy accuracy,
    Effort effort,
    int stepsBelowTolerance) {
  /** The status of a run that came to its end. */
  public static final String OK = "ok";

  private static final int INTERVALS = 10;

  /** {@return how many steps were done} */
  public int steps() {
    return history.size();
  }

  /** {@return wall time per step done; NaN if there are none} */
  public double nanosPerStep() {
    return steps() == 0 ? Double.NaN : (double) effort.nanos() / steps();
  }

  /** {@return the estimates at every tenth part of the steps done, first and last included} */
  public List<Snapshot> checkpoints() {
    List<Snapshot> chosen = new ArrayList<>();
    int last = steps() - 1;
    int previous = -1;
    for (int i = 0; i <= INTERVALS && last >= 0; i++) {
      int step = (int) Math.rint(i * (double) last / INTERVALS);
      if (step != previous) {
        chosen.add(history.get(step));
      }
      previous = step;
    }
    return chosen;
  }
}

package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.smoother.FixedIntervalSmoother;
import dev.estimation.filters.smoother.SmoothedTrack;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Follows a filter run and makes a run of the smoothed track of it. That run has the steps of the
 * filter and ends where it ended; it has no innovations, and as the smoother asks no model, its
 * evaluations and Jacobians are 0. Its time is that of the way back alone.
 */
final class TrackSmoother {
  private final Scenario scenario;
  private final FixedIntervalSmoother smoother;
  /** For each step the record that holds it; a step over no time shares that of the one before. */
  private final List<Integer> records = new ArrayList<>();

  TrackSmoother(Scenario scenario, Estimate start) {
    this.scenario = scenario;
    this.smoother = FixedIntervalSmoother.startingAt(start);
  }

  /** Follows a step that is done. */
  void record(FilterWorkspace workspace, Estimate estimate) {
    smoother.record(workspace, estimate);
    records.add(smoother.size() - 1);
  }

  /** Goes back over the track, once the filter run is at its end. */
  RunResult smooth(RunResult filtered) {
    long begun = System.nanoTime();
    try {
      SmoothedTrack track = smoother.smooth();
      long nanos = System.nanoTime() - begun;
      return result(filtered.status(), snapshots(track, filtered.history()), nanos);
    } catch (ArithmeticException refused) {
      String status = "smoother failed: " + refused.getMessage();
      return result(status, List.of(), System.nanoTime() - begun);
    }
  }

  private List<Snapshot> snapshots(SmoothedTrack track, List<Snapshot> filtered) {
    List<Snapshot> smoothed = new ArrayList<>();
    for (Snapshot snapshot : filtered) {
      int step = snapshot.step();
      try {
        smoothed.add(new Snapshot(step, snapshot.time(), track.gaussian(records.get(step))));
      } catch (IllegalArgumentException indefinite) {
        throw (ArithmeticException)
            new ArithmeticException("step " + step + ": " + indefinite.getMessage())
                .initCause(indefinite);
      }
    }
    return smoothed;
  }

  private RunResult result(String status, List<Snapshot> history, long nanos) {
    Optional<AccuracyTally> accuracy = scenario.accuracy();
    accuracy.ifPresent(tally -> history.forEach(each -> tally.add(each.time(), each.estimate())));
    return new RunResult(
        status,
        history,
        Optional.empty(),
        accuracy.map(AccuracyTally::summary).orElse(Accuracy.NONE),
        new Effort(0, 0, nanos),
        0);
  }
}

package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.RunFollower;
import dev.estimation.benchmarks.replay.RunTrace;
import dev.estimation.benchmarks.replay.Snapshot;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;

/**
 * A trace and a progress bar.
 *
 * @param trace is told of predictions and updates
 * @param bar is told of steps done
 */
record Followers(RunTrace trace, Progress.Bar bar) implements RunFollower {
  @Override
  public void predicted(int step, Step to, StepStatus status, FilterWorkspace told) {
    trace.predicted(step, to, status, told);
  }

  @Override
  public void updated(int step, Measurement measurement, StepStatus status, SensorPort told) {
    trace.updated(step, measurement, status, told);
  }

  @Override
  public void done(Snapshot snapshot) {
    bar.done(snapshot);
  }
}

package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;

/**
 * Is told what happens in a run, in the order in which it happens. What it is handed is to be read at once and not kept.
 * Its work in all but {@link #done} counts as time of the run, so a run that is timed has none that is told more.
 */
public interface RunFollower {
  /** Follows nothing. */
  RunFollower NONE = new RunFollower() {};

  /** A prediction to a step is about to be made. */
  default void predicting(int step, Step to, Estimate from) {}

  /** It was made, or refused. */
  default void predicted(int step, Step to, StepStatus status, FilterWorkspace told) {}

  /** An update is about to be made. */
  default void updating(int step, Measurement measurement, Estimate prior) {}

  /** It was made, or refused. */
  default void updated(int step, Measurement measurement, StepStatus status, SensorPort told) {}

  /** A step is done, and it was not timed any more. */
  default void done(Snapshot snapshot) {}
}

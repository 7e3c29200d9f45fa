package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/** Keeps what every prediction and update of a run had to tell. */
public final class RunTrace implements RunFollower {
  private final List<PredictionRecord> predictions = new ArrayList<>();
  private final List<UpdateRecord> updates = new ArrayList<>();

  /**
   * What one prediction had to tell.
   *
   * @param time that was predicted to (s)
   * @param status how it ended
   * @param evaluations of the motion model
   * @param jacobians formed
   */
  public record PredictionRecord(double time, StepStatus status, int evaluations, int jacobians) {}

  @Override
  public void predicted(int step, Step to, StepStatus status, FilterWorkspace told) {
    predictions.add(new PredictionRecord(to.time(), status, told.evaluations(), told.jacobians()));
  }

  @Override
  public void updated(int step, Measurement measurement, StepStatus status, SensorPort told) {
    updates.add(new UpdateRecord(step, measurement.sensor(), status, told));
  }

  /** {@return one record for each step that was begun} */
  public List<PredictionRecord> predictions() {
    return Collections.unmodifiableList(predictions);
  }

  /** {@return one record for each update, in order} */
  public List<UpdateRecord> updates() {
    return Collections.unmodifiableList(updates);
  }
}

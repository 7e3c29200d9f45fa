package dev.estimation.benchmarks.page;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.RunFollower;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.model.MotionModel;
import java.util.ArrayList;
import java.util.List;

/** Collects places at even distances in a run, some before updates and some before predictions. */
final class CloudSearch implements RunFollower {
  static final int LOOKS = 60;

  private final Scenario scenario;
  private final int updateStride;
  private final int predictionStride;
  private final List<CloudPoint> updates = new ArrayList<>();
  private final List<CloudPoint> predictions = new ArrayList<>();
  private int seen;

  CloudSearch(Scenario scenario) {
    this.scenario = scenario;
    int rows =
        scenario.steps().stream().mapToInt(step -> step.measurements().size()).sum();
    this.updateStride = 1 + rows / LOOKS;
    this.predictionStride = 1 + scenario.steps().size() / LOOKS;
  }

  @Override
  public void predicting(int step, Step to, Estimate from) {
    boolean moves = step > 0 && to.time() > from.time();
    if (moves
        && (step - 1) % predictionStride == 0
        && scenario.motion() instanceof MotionModel motion) {
      predictions.add(CloudPoint.of(step, motion, to, from));
    }
  }

  @Override
  public void updating(int step, Measurement measurement, Estimate prior) {
    if (seen++ % updateStride == 0) {
      updates.add(CloudPoint.of(step, measurement, prior));
    }
  }

  List<CloudPoint> updates() {
    return updates;
  }

  List<CloudPoint> predictions() {
    return predictions;
  }
}

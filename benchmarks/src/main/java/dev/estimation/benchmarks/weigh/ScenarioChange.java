package dev.estimation.benchmarks.weigh;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.filters.model.SensorModel;
import java.util.Arrays;
import java.util.IdentityHashMap;
import java.util.List;

/**
 * What is changed of a scenario before it is run.
 *
 * @param noiseScale of the standard deviations of all measurement noise; above 0
 * @param rows the most that are kept of each step, the first ones, stacked or not
 * @param lag how much earlier than said everything was measured and commanded (s); may be negative. It moves the run
 *     against the truth
 */
public record ScenarioChange(double noiseScale, int rows, double lag) {
  /** Refuses numbers that make no scenario. */
  public ScenarioChange {
    if (!(noiseScale > 0 && Double.isFinite(noiseScale)) || rows < 1 || !Double.isFinite(lag)) {
      throw new IllegalArgumentException(
          "noise scale must be above 0 and finite, rows 1 or more, lag finite, got " + noiseScale
              + ", " + rows + ", " + lag);
    }
  }

  /** {@return the changed scenario} */
  public Scenario of(Scenario scenario) {
    IdentityHashMap<SensorModel, SensorModel> sensors = new IdentityHashMap<>();
    return new Scenario(
        scenario.motion(),
        scenario.gateProbability(),
        scenario.start(),
        scenario.steps().stream().map(step -> changed(step, sensors)).toList(),
        scenario.truth());
  }

  private Step changed(Step step, IdentityHashMap<SensorModel, SensorModel> sensors) {
    List<Measurement> kept =
        step.measurements().subList(0, Math.min(rows, step.measurements().size()));
    return new Step(
        step.time() - lag,
        step.control(),
        kept.stream().map(row -> changed(row, sensors)).toList());
  }

  private Measurement changed(Measurement row, IdentityHashMap<SensorModel, SensorModel> sensors) {
    SensorModel sensor = noiseScale == 1
        ? row.sensor()
        : sensors.computeIfAbsent(row.sensor(), one -> ScaledSensor.of(one, noiseScale));
    if (!row.isStacked()) {
      return new Measurement(sensor, row.value(), row.given());
    }
    int kept = Math.min(rows, row.rows());
    return Measurement.stacked(
        sensor, kept, part(row.value(), kept, row.rows()), part(row.given(), kept, row.rows()));
  }

  private static double[] part(double[] all, int kept, int of) {
    return Arrays.copyOf(all, all.length / of * kept);
  }
}

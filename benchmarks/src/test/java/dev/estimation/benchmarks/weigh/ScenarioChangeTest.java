package dev.estimation.benchmarks.weigh;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableSensor;
import dev.estimation.filters.motion.RandomWalk;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.Range;
import dev.estimation.filters.sensor.Sight;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ScenarioChangeTest {
  private final Range range = new Range(Sight.fromGiven(Components.of(0, 1)), 0.5);
  private final Scenario scenario = new Scenario(
      new RandomWalk(1, 1),
      OptionalDouble.empty(),
      Gaussian.independent(new double[2], new double[] {1, 1}),
      List.of(
          new Step(0, List.of(new Measurement(range, new double[] {1}, 1, 0))),
          new Step(
              2,
              List.of(
                  Measurement.stacked(range, 2, new double[] {1, 2}, new double[] {1, 0, 2, 0}),
                  new Measurement(range, new double[] {3}, 3, 0)))),
      Optional.empty());

  @Test
  void noiseIsScaledAndAllElseOfTheSensorKept() {
    List<Step> steps = new ScenarioChange(2, Integer.MAX_VALUE, 0).of(scenario).steps();
    SensorModel scaled = steps.get(0).measurements().get(0).sensor();
    assertInstanceOf(TwiceDifferentiableSensor.class, scaled);
    assertSame(scaled, steps.get(1).measurements().get(1).sensor(), "one sensor stays one");
    double[] noise = new double[1];
    scaled.measurementNoise(new double[2], new double[2], noise);
    assertEquals(4 * 0.25, noise[0], 0, "exact: powers of two");
    assertEquals("Range", FunctionNames.of(scaled));
    double[] derivatives = new double[2];
    ((TwiceDifferentiableSensor) scaled)
        .measureJacobian(new double[] {5, 0}, new double[] {1, 0}, derivatives);
    assertArrayEquals(new double[] {1, 0}, derivatives, 1e-15);
    assertSame(
        range,
        new ScenarioChange(1, 9, 0)
            .of(scenario)
            .steps()
            .get(0)
            .measurements()
            .get(0)
            .sensor());
  }

  @Test
  void rowsAreLeftOutAndTimesMoved() {
    Step last = new ScenarioChange(1, 1, 0.25).of(scenario).steps().get(1);
    assertEquals(1.75, last.time(), 0);
    assertEquals(1, last.measurements().size());
    assertEquals(1, last.measurements().get(0).rows());
    assertArrayEquals(new double[] {1}, last.measurements().get(0).value(), 0);
    assertArrayEquals(new double[] {1, 0}, last.measurements().get(0).given(), 0);
  }

  @Test
  void badNumbersAreRefused() {
    assertThrows(IllegalArgumentException.class, () -> new ScenarioChange(0, 1, 0));
    assertThrows(IllegalArgumentException.class, () -> new ScenarioChange(1, 0, 0));
    assertThrows(IllegalArgumentException.class, () -> new ScenarioChange(1, 1, Double.NaN));
  }
}

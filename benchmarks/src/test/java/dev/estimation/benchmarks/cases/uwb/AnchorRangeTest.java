package dev.estimation.benchmarks.cases.uwb;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.benchmarks.cases.ModelJacobians;
import dev.estimation.core.space.Space;
import org.junit.jupiter.api.Test;

class AnchorRangeTest {
  private final AnchorRange sensor = new AnchorRange(1.5, 0.25, 0.2);

  @Test
  void measuresTheDistanceInSpacePlusBias() {
    double[] seen = new double[1];
    sensor.measure(new double[] {3, 7, 0, 0}, new double[] {1, 4, 7.5}, seen);
    assertEquals(7.25, seen[0], 0);
  }

  @Test
  void jacobianIsThatOfTheMeasurement() {
    double[] state = {-2.5, -4, 1, 0.5};
    double[] scales = {1, 1, 1, 1};
    double[] anchor = {2.5775, 0.87, 1.97};
    ModelJacobians.sensor(sensor, Space.reals(4), state, anchor, scales);
  }
}

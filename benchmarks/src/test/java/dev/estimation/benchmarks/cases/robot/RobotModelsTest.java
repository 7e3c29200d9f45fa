package dev.estimation.benchmarks.cases.robot;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.benchmarks.cases.ModelJacobians;
import dev.estimation.core.space.Space;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RobotModelsTest {
  private static final Space POSE = Space.reals(2).and(Space.angles(1));

  private final LandmarkSensor sensor = new LandmarkSensor(0.5, 0.05);

  @Test
  void seesRangeAndBearingFromItsHeading() {
    double[] seen = new double[2];
    sensor.measure(new double[] {1, 2, 0.25}, new double[] {4, 6}, seen);
    assertArrayEquals(new double[] {5, Math.atan2(4, 3) - 0.25}, seen, 1e-15); // one rounding
  }

  /** Behind the robot the direction crosses its seam. */
  @ParameterizedTest
  @ValueSource(doubles = {2, 1e-7, -1e-7, -9})
  void sensorJacobianIsThatOfTheMeasurement(double y) {
    double[] state = {4, 1, -2.9};
    double[] landmark = {-1, 1 + y};
    double[] scales = {1, 1, 1};
    ModelJacobians.sensor(sensor, POSE, state, landmark, scales);
  }
}

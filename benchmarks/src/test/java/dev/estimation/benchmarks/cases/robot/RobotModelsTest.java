package dev.estimation.benchmarks.cases.robot;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.benchmarks.cases.ModelJacobians;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RobotModelsTest {
  private static final double[] NO_NOISE = new double[2];

  private final ArcMotion motion = new ArcMotion(5e-4, 2e-3);
  private final LandmarkSensor sensor = new LandmarkSensor(0.5, 0.05);

  /** A quarter turn to the left from the x axis, on a circle of radius speed / turn rate. */
  @Test
  void drivesOnACircle() {
    double[] next = new double[3];
    double dt = Math.PI / 2 / 0.1;
    motion.move(new double[] {1, 2, 0}, NO_NOISE, new double[] {0.3, 0.1}, 0, dt, next);
    assertArrayEquals(new double[] {4, 5, Math.PI / 2}, next, 4e-15); // a few roundings of 5
  }

  @Test
  void drivesStraightWithoutTurnRateAndNoiseAddsToTheCommand() {
    double[] next = new double[3];
    double[] noise = {0.5, 0.2};
    motion.move(new double[] {1, 2, 0}, noise, new double[] {1.5, -0.2}, 0, 2, next);
    assertArrayEquals(new double[] {5, 2, 0}, next, 0);
  }

  /** A turn rate bends the move when it makes a turn of about 1 rad. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 1e-12, -1e-6, 1.9e-4, 2.1e-4, -0.019, 0.021, 0.4, -2.5})
  void jacobiansAreThoseOfTheMove(double turnRate) {
    double[] state = {2.5, -1.5, 3.1};
    double[] control = {0.086, turnRate};
    for (double dt : new double[] {1, 0.01}) {
      for (double[] noise : new double[][] {NO_NOISE, {0.3, -0.1}}) {
        ModelJacobians.noiseDriven(motion, state, noise, control, dt, 1, 1, 1, 1 / dt, 1 / dt);
      }
    }
  }

  @Test
  void noiseIsWhiteHeldOverTheStep() {
    double[] covariance = new double[4];
    motion.noiseCovariance(new double[2], 0, 0.5, covariance);
    assertArrayEquals(new double[] {1e-3, 0, 0, 4e-3}, covariance, 0);
  }

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
    ModelJacobians.sensor(sensor, motion.stateSpace(), state, landmark, scales);
  }
}

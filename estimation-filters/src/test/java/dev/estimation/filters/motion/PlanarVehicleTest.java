package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PlanarVehicleTest {
  private static final double[] NO_NOISE = new double[2];

  private final PlanarVehicle motion = new PlanarVehicle(5e-4, 2e-3);

  /** A quarter turn to the left from the x axis, on a circle of radius speed / yaw rate. */
  @Test
  void drivesOnACircle() {
    double[] next = new double[3];
    double dt = Math.PI / 2 / 0.1;
    motion.move(new double[] {1, 2, 0}, NO_NOISE, new double[] {0.3, 0.1}, 0, dt, next);
    assertArrayEquals(new double[] {4, 5, Math.PI / 2}, next, 4e-15); // a few roundings of 5
  }

  @Test
  void drivesStraightWithoutYawRateAndNoiseAddsToTheCommand() {
    double[] next = new double[3];
    double[] noise = {0.5, 0.2};
    motion.move(new double[] {1, 2, 0}, noise, new double[] {1.5, -0.2}, 0, 2, next);
    assertArrayEquals(new double[] {5, 2, 0}, next, 0);
  }

  /** A yaw rate bends the move when it makes a turn of about 1 rad. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 1e-12, -1e-6, 1.9e-4, 2.1e-4, -0.019, 0.021, 0.4, -2.5})
  void jacobiansAreThoseOfTheMove(double yawRate) {
    double[] state = {2.5, -1.5, 3.1};
    double[] control = {0.086, yawRate};
    for (double dt : new double[] {1, 0.01}) {
      for (double[] noise : new double[][] {NO_NOISE, {0.3, -0.1}}) {
        MotionFunctions.checkDerivatives(
            motion, state, noise, control, dt, 1, 1, 1, 1 / dt, 1 / dt);
      }
    }
  }

  /** Place and noise of the speed: a step along them of any length changes the move by what a half of it does, twice. */
  @Test
  void linearInputsAreLinear() {
    assertArrayEquals(new int[] {0, 1, 3}, motion.structure().linearInputs());
    double[] control = {2, 0.3};
    double[] here = moved(new double[] {1, 2, 0.4}, new double[] {0.1, 0.2}, control);
    double[] half = moved(new double[] {5, -9, 0.4}, new double[] {7.1, 0.2}, control);
    double[] whole = moved(new double[] {9, -20, 0.4}, new double[] {14.1, 0.2}, control);
    for (int i = 0; i < 3; i++) {
      assertEquals(whole[i], 2 * half[i] - here[i], 1e-14); // roundings of 30
    }
  }

  private double[] moved(double[] state, double[] noise, double[] control) {
    double[] next = new double[3];
    motion.move(state, noise, control, 0, 1.3, next);
    return next;
  }

  @Test
  void noiseIsWhiteHeldOverTheStep() {
    double[] covariance = new double[4];
    motion.noiseCovariance(new double[2], 0, 0.5, covariance);
    assertArrayEquals(new double[] {1e-3, 0, 0, 4e-3}, covariance, 0);
  }
}

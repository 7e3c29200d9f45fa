package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import org.junit.jupiter.api.Test;

class GyroscopeAttitudeTest extends MotionContract {
  @Override
  DifferentiableMotion model() {
    return new GyroscopeAttitude(1e-6, 1e-8);
  }

  @Override
  double[] control() {
    return new double[] {0.3, -0.2, 0.5};
  }

  /** No turn, next to none, and at both sides of a turn of 1 rad in 1 s, where the series ends. */
  @Override
  double[][] states() {
    return new double[][] {
      {1, 0, 0, 0, 0.3, -0.2, 0.5},
      {0.5, 0.5, -0.5, 0.5, 0.3, -0.2 + 1e-7, 0.5},
      {0, 0.6, 0.8, 0, 0.3, -0.2, -0.499},
      {0, 0.6, 0, 0.8, 0.3, -0.2, -0.501},
      {0, 0, 0, 1, 0.01, 0.02, -0.03}
    };
  }

  /** Over 40 s the last of them turn by 25 rad, and the differences are still small turns. */
  @Override
  double[] scales() {
    return new double[] {1, 1, 1, 0.02, 0.02, 0.02};
  }

  /** Less its bias the reading is a turn about z, by 90 degrees; then by 180 about it, from there. */
  @Test
  void turnsByTheReadingLessTheBias() {
    double half = Math.sqrt(0.5);
    double[] reading = {0.1, 0.2, 0.3 + Math.PI / 2};
    double[] start = {1, 0, 0, 0, 0.1, 0.2, 0.3};
    double[] quarter = MotionFunctions.moved(model(), start, reading, 1);
    double[] expected = {half, 0, 0, half, 0.1, 0.2, 0.3};
    assertArrayEquals(expected, quarter, 4e-16); // roundings of numbers below 1 and of the rates
    double[] more = MotionFunctions.moved(model(), quarter, reading, 2);
    assertArrayEquals(new double[] {-half, 0, 0, half, 0.1, 0.2, 0.3}, more, 8e-16);
  }

  /** A turn is about axes of the body: first x forward to z, then about the new z. */
  @Test
  void turnsInTheBody() {
    double half = Math.sqrt(0.5);
    double[] pitched = {half, 0, -half, 0, 0, 0, 0};
    double[] turned = MotionFunctions.moved(model(), pitched, new double[] {0, 0, Math.PI / 2}, 1);
    // (half, 0, -half, 0) * (half, 0, 0, half) by hand.
    assertArrayEquals(new double[] {0.5, -0.5, -0.5, 0.5, 0, 0, 0}, turned, 2e-16);
  }

  /** Without a turn that of a constant velocity on each axis, the bias being taken off, with n dt besides. */
  @Test
  void noiseIsThatOfTheTangentSpace() {
    double dt = 0.5;
    double[] noise = MotionFunctions.noise(model(), states()[0], control(), dt);
    double[] expected = new double[36];
    for (int i = 0; i < 3; i++) {
      expected[7 * i] = 1e-6 * dt + 1e-8 * dt * dt * dt / 3;
      expected[7 * i + 3] = -1e-8 * dt * dt / 2;
      expected[7 * i + 18] = expected[7 * i + 3];
      expected[7 * i + 21] = 1e-8 * dt;
    }
    assertArrayEquals(expected, noise, 1e-22); // a rounding of 5e-7
  }

  /** At a rate that stays, however far it turns: to roundings of numbers not above the deviations of both components. */
  @Test
  void noiseComposesOverTime() {
    for (double[] state : states()) {
      for (double h : new double[] {1e-9, 0.01, 0.6, 1, 40}) {
        double[] f = MotionFunctions.jacobian(model(), state, control(), h);
        double[] q = MotionFunctions.noise(model(), state, control(), h);
        double[] both = MotionFunctions.noise(model(), state, control(), 2 * h);
        checkComposes(f, q, q, both, 6, 1e-14);
      }
    }
  }
}

package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import org.junit.jupiter.api.Test;

class ConstantAccelerationTest extends MotionContract {
  @Override
  DifferentiableMotion model() {
    return new ConstantAcceleration(0.3, 0.6, 0.01);
  }

  @Override
  double[][] states() {
    return new double[][] {{10, -20, 5, 3, 4, 1, -0.5, 0.2, 9.81}, new double[9]};
  }

  @Override
  double[] scales() {
    return new double[] {1, 1, 1, 1, 1, 1, 1, 1, 1};
  }

  @Test
  void fallsFreely() {
    DifferentiableMotion line = new ConstantAcceleration(1);
    double[] next = MotionFunctions.moved(line, new double[] {100, 5, -8}, control(), 2);
    assertArrayEquals(new double[] {94, -11, -8}, next, 0);
  }

  /** The integrals of s^4 / 4, s^3 / 2, s^2 / 2, s^2, s and 1 from 0 to 2. */
  @Test
  void noiseIsThatOfWhiteJerk() {
    DifferentiableMotion line = new ConstantAcceleration(3);
    double[] noise = MotionFunctions.noise(line, new double[3], control(), 2);
    double[] expected = {4.8, 6, 4, 6, 8, 6, 4, 6, 6};
    assertArrayEquals(expected, noise, 2e-15); // two roundings of numbers up to 8
  }
}

package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import org.junit.jupiter.api.Test;

class ConstantVelocityTest extends MotionContract {
  @Override
  DifferentiableMotion model() {
    return new ConstantVelocity(0.3, 0.6);
  }

  @Override
  double[][] states() {
    return new double[][] {{10, -20, 3, 4}, {0, 0, 0, 0}};
  }

  @Override
  double[] scales() {
    return new double[] {1, 1, 1, 1};
  }

  @Test
  void movesAlongTheVelocity() {
    double[] next = MotionFunctions.moved(model(), new double[] {1, 2, 3, -4}, control(), 2);
    assertArrayEquals(new double[] {7, -6, 3, -4}, next, 0);
  }

  @Test
  void noiseIsThatOfWhiteAcceleration() {
    double[] noise = MotionFunctions.noise(model(), new double[4], control(), 2);
    double[] expected = {0.8, 0, 0.6, 0, 0, 1.6, 0, 1.2, 0.6, 0, 0.6, 0, 0, 1.2, 0, 1.2};
    assertArrayEquals(expected, noise, 1e-15); // a few roundings of numbers near 1
  }
}

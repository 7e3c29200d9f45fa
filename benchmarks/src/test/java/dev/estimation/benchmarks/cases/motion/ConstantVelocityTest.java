package dev.estimation.benchmarks.cases.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.benchmarks.cases.ModelJacobians;
import org.junit.jupiter.api.Test;

class ConstantVelocityTest {
  private final ConstantVelocity model = new ConstantVelocity(0.3, 0.6);

  @Test
  void movesAlongTheVelocity() {
    double[] next = new double[4];
    model.move(new double[] {1, 2, 3, -4}, new double[0], 5, 2, next);
    assertArrayEquals(new double[] {7, -6, 3, -4}, next, 0);
  }

  @Test
  void noiseIsThatOfWhiteAcceleration() {
    double[] noise = new double[16];
    model.processNoise(new double[4], new double[0], 0, 2, noise);
    double[] expected = {0.8, 0, 0.6, 0, 0, 1.6, 0, 1.2, 0.6, 0, 0.6, 0, 0, 1.2, 0, 1.2};
    assertArrayEquals(expected, noise, 1e-15); // a few roundings of numbers near 1
  }

  @Test
  void jacobianIsThatOfTheMove() {
    double[] scales = {1, 1, 1, 1};
    ModelJacobians.motion(model, new double[] {10, -20, 3, 4}, 1.5, scales);
  }
}

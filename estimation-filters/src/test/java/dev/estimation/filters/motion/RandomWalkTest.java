package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import org.junit.jupiter.api.Test;

class RandomWalkTest extends MotionContract {
  @Override
  DifferentiableMotion model() {
    return new RandomWalk(0.5, 0, 3);
  }

  @Override
  double[][] states() {
    return new double[][] {{1, -2, 1e7}, {0, 0, 0}};
  }

  @Override
  double[] scales() {
    return new double[] {1, 1, 1};
  }

  @Test
  void staysAndSpreads() {
    double[] state = {1, -2, 1e7};
    assertArrayEquals(state, MotionFunctions.moved(model(), state, control(), 4), 0);
    double[] expected = {2, 0, 0, 0, 0, 0, 0, 0, 12};
    assertArrayEquals(expected, MotionFunctions.noise(model(), state, control(), 4), 0);
  }
}

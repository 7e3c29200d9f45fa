package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import org.junit.jupiter.api.Test;

class ReceiverClockTest extends MotionContract {
  @Override
  DifferentiableMotion model() {
    return new ReceiverClock(2e-3, 3e-8);
  }

  @Override
  double[][] states() {
    return new double[][] {{4, -0.5}, {3e5, 60}};
  }

  @Override
  double[] scales() {
    return new double[] {1, 1};
  }

  @Test
  void runsByItsDrift() {
    double[] next = MotionFunctions.moved(model(), new double[] {4, -0.5}, control(), 30);
    assertArrayEquals(new double[] {-11, -0.5}, next, 0);
  }

  /** p dt + f dt^3 / 3, f dt^2 / 2, f dt by hand. */
  @Test
  void noiseIsThatOfPhaseAndFrequency() {
    double[] noise = MotionFunctions.noise(model(), new double[2], control(), 10);
    double[] expected = {0.02001, 1.5e-6, 1.5e-6, 3e-7};
    assertArrayEquals(expected, noise, 4e-18); // roundings of 0.02
  }
}

package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;

class CoordinatedTurnTest extends MotionContract {
  @Override
  DifferentiableMotion model() {
    return new CoordinatedTurn(0.1, 2e-4);
  }

  /** Through the ends of the series of the arc, with a step of 1 s and of others. */
  @Override
  double[][] states() {
    return DoubleStream.of(0, 1e-6, -4e-5, 1e-4, 9e-3, -0.02, 0.3, -1.2)
        .mapToObj(rate -> new double[] {40, -30, 4, 2.5, rate})
        .toArray(double[][]::new);
  }

  @Override
  double[] scales() {
    return new double[] {100, 100, 3, 3, 0.1};
  }

  /** A quarter turn from x to y, on a circle of radius speed / turn rate. */
  @Test
  void turnsOnACircle() {
    double rate = 0.1;
    double[] start = {10, 20, 5, 0, rate};
    double[] next = MotionFunctions.moved(model(), start, control(), Math.PI / 2 / rate);
    assertArrayEquals(new double[] {60, 70, 0, 5, rate}, next, 1e-13); // rounding of 70
  }

  @Test
  void goesStraightWithoutTurnRate() {
    double[] next = MotionFunctions.moved(model(), new double[] {10, 20, 5, -3, 0}, control(), 2);
    assertArrayEquals(new double[] {20, 14, 5, -3, 0}, next, 0);
  }

  @Test
  void noiseHasNoTermsBetweenTurnAndVelocity() {
    double[] noise = MotionFunctions.noise(model(), new double[5], control(), 3);
    double[] expected = {
      0.9, 0, 0.45, 0, 0, 0, 0.9, 0, 0.45, 0, 0.45, 0, 0.3, 0, 0, 0, 0.45, 0, 0.3, 0, 0, 0, 0, 0,
      6e-4
    };
    assertArrayEquals(expected, noise, 1e-15); // a few roundings of numbers near 1
  }
}

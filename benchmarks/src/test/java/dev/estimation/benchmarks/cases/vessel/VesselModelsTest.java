package dev.estimation.benchmarks.cases.vessel;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.benchmarks.cases.ModelJacobians;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class VesselModelsTest {
  private static final double[] SCALES = {100, 100, 3, 3, 0.5};

  private final CoordinatedTurn turn = new CoordinatedTurn(0.1, 2e-4);
  private final ShipRadar radar = new ShipRadar(4, 0.03);

  /** A quarter turn from north to east, on a circle of radius speed / turn rate. */
  @Test
  void turnsOnACircle() {
    double[] next = new double[5];
    double rate = 0.1;
    double dt = Math.PI / 2 / rate;
    turn.move(new double[] {10, 20, 5, 0, rate}, new double[0], 0, dt, next);
    assertArrayEquals(new double[] {60, 70, 0, 5, rate}, next, 1e-13); // rounding of 70
  }

  @Test
  void goesStraightWithoutTurnRate() {
    double[] next = new double[5];
    turn.move(new double[] {10, 20, 5, -3, 0}, new double[0], 0, 2, next);
    assertArrayEquals(new double[] {20, 14, 5, -3, 0}, next, 0);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 1e-6, -4e-5, 1e-4, 9e-3, -0.02, 0.3, -1.2})
  void turnJacobianIsThatOfTheMove(double rate) {
    ModelJacobians.motion(turn, new double[] {40, -30, 4, 2.5, rate}, 1.7, SCALES);
  }

  @Test
  void turnNoiseHasNoCrossTerms() {
    double[] noise = new double[25];
    turn.processNoise(new double[5], new double[0], 0, 3, noise);
    double[] expected = {
      0.9, 0, 0.45, 0, 0, 0, 0.9, 0, 0.45, 0, 0.45, 0, 0.3, 0, 0, 0, 0.45, 0, 0.3, 0, 0, 0, 0, 0,
      6e-4
    };
    assertArrayEquals(expected, noise, 1e-15); // a few roundings of numbers near 1
  }

  @Test
  void radarSeesRangeAndBearingFromTheOwnShip() {
    double[] seen = new double[2];
    radar.measure(new double[] {103, 54, 9, 9}, new double[] {100, 50}, seen);
    assertArrayEquals(new double[] {5, Math.atan2(4, 3)}, seen, 1e-15); // one rounding
  }

  /** Behind the ship the bearing crosses its seam. */
  @ParameterizedTest
  @ValueSource(doubles = {30, 1e-7, -1e-7, -200})
  void radarJacobianIsThatOfTheMeasurement(double east) {
    double[] state = {-80, 50 + east, 1, 2, 0.1};
    double[] ownShip = {20, 50};
    ModelJacobians.sensor(radar, turn.stateSpace(), state, ownShip, SCALES);
  }
}

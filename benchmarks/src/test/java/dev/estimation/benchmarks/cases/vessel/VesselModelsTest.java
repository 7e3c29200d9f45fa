package dev.estimation.benchmarks.cases.vessel;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import dev.estimation.benchmarks.cases.ModelJacobians;
import dev.estimation.core.space.Space;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class VesselModelsTest {
  private static final double[] SCALES = {100, 100, 3, 3, 0.5};

  private final ShipRadar radar = new ShipRadar(4, 0.03);

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
    ModelJacobians.sensor(radar, Space.reals(5), state, ownShip, SCALES);
  }
}

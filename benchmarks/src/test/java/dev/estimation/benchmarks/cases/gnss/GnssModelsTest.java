package dev.estimation.benchmarks.cases.gnss;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.benchmarks.cases.ModelJacobians;
import dev.estimation.core.space.Space;
import org.junit.jupiter.api.Test;

class GnssModelsTest {
  /** Ranges bend over the distance of a satellite. */
  private static final double[] SCALES = {1e7, 1e7, 1e7, 1e7, 1e6};

  private final Pseudorange sensor = new Pseudorange(0.8, 0.6);

  @Test
  void measuresDistancePlusClock() {
    double[] seen = new double[1];
    sensor.measure(new double[] {1, 2, 3, 0.25, 9}, new double[] {3, 5, 9, 0.1}, seen);
    assertEquals(7.25, seen[0], 0);
  }

  @Test
  void sensorJacobianIsThatOfTheMeasurement() {
    double[] state = {1.2e6, 2.5e5, 6.2e6, 40, 0.1};
    double[] satellite = {-1.45e7, -2.6e6, 2.19e7, 0.58};
    ModelJacobians.sensor(sensor, Space.reals(5), state, satellite, SCALES);
  }

  /** sin(30 degrees) = 1/2: the part that grows towards the horizon counts four times. */
  @Test
  void lowSatellitesAreNoisy() {
    double[] noise = new double[1];
    sensor.measurementNoise(new double[5], new double[] {0, 0, 0, Math.PI / 6}, noise);
    assertEquals(0.64 + 4 * 0.36, noise[0], 2e-15); // a few roundings of 2
  }
}

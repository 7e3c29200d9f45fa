package dev.estimation.benchmarks.cases.gnss;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class GnssModelsTest {
  /** sin(30 degrees) = 1/2: the part that grows towards the horizon counts four times. */
  @Test
  void lowSatellitesAreNoisy() {
    assertEquals(
        Math.sqrt(0.64 + 4 * 0.64), GnssLog.deviation(Math.PI / 6), 1e-15); // a few roundings of 2
  }
}

package dev.estimation.benchmarks.cases.vessel;

/**
 * One detection of a target by the radar.
 *
 * @param time s, of the radar's clock
 * @param scan number of the scan
 * @param ownNorth own ship (m)
 * @param ownEast own ship (m)
 * @param range m
 * @param bearing rad, from north to east
 */
record RadarPlot(
    double time, long scan, double ownNorth, double ownEast, double range, double bearing) {
  double north() {
    return ownNorth + range * Math.cos(bearing);
  }

  double east() {
    return ownEast + range * Math.sin(bearing);
  }
}

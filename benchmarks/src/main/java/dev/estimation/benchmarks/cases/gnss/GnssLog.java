package dev.estimation.benchmarks.cases.gnss;

import dev.estimation.benchmarks.log.CsvRow;
import dev.estimation.benchmarks.log.CsvTable;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.filters.model.SensorModel;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The pseudoranges of a log as steps: one for each run of rows of one time, stacked. */
final class GnssLog {
  /** Standard deviation of the error that is the same at every elevation (m). */
  private static final double DEVIATION = 0.8;

  /** That of the error that goes with 1 / sin(elevation) (m). */
  private static final double LOW_DEVIATION = 0.8;

  private final List<Step> steps = new ArrayList<>();
  private final Optional<double[]> place;

  GnssLog(LogFolder log, SensorModel sensor) {
    readSteps(log, sensor);
    this.place = readPlace(log);
  }

  private void readSteps(LogFolder log, SensorModel sensor) {
    CsvTable table = CsvTable.read(
            log.file("pseudoranges.csv"),
            "time_s",
            "pseudorange_l1_m",
            "sat_x_m",
            "sat_y_m",
            "sat_z_m",
            "sat_clock_m",
            "ionosphere_model_m",
            "troposphere_model_m",
            "elevation_rad")
        .requireRows();
    List<CsvRow> epoch = new ArrayList<>();
    double time = Double.NaN;
    for (CsvRow row : table.rows()) {
      double rowTime = row.number("time_s");
      if (rowTime != time && !epoch.isEmpty()) {
        steps.add(new Step(time, List.of(stacked(epoch, sensor))));
        epoch.clear();
      }
      time = rowTime;
      epoch.add(row);
    }
    steps.add(new Step(time, List.of(stacked(epoch, sensor))));
  }

  private static Measurement stacked(List<CsvRow> epoch, SensorModel sensor) {
    int width = sensor.givenDimension();
    double[] ranges = new double[epoch.size()];
    double[] satellites = new double[epoch.size() * width];
    for (int i = 0; i < ranges.length; i++) {
      CsvRow row = epoch.get(i);
      ranges[i] = range(row);
      satellites[i * width] = row.number("sat_x_m");
      satellites[i * width + 1] = row.number("sat_y_m");
      satellites[i * width + 2] = row.number("sat_z_m");
      satellites[i * width + 3] = deviation(row.number("elevation_rad"));
    }
    return Measurement.stacked(sensor, ranges.length, ranges, satellites);
  }

  /** That of two independent errors: low satellites are heard with more noise. */
  static double deviation(double elevation) {
    double low = LOW_DEVIATION / Math.sin(elevation);
    return Math.sqrt(DEVIATION * DEVIATION + low * low);
  }

  /** The pseudorange less what is known of its errors: all but noise and the receiver's clock. */
  private static double range(CsvRow row) {
    return row.number("pseudorange_l1_m")
        + row.number("sat_clock_m")
        - row.number("ionosphere_model_m")
        - row.number("troposphere_model_m");
  }

  private static Optional<double[]> readPlace(LogFolder log) {
    CsvTable table = CsvTable.readIfPresent(log.file("truth.csv"), "x_m", "y_m", "z_m");
    double[] place = null;
    for (CsvRow row : table.rows()) {
      if (place != null) {
        throw row.error("x_m", "must be the only row, since the receiver is at rest");
      }
      place = new double[] {row.number("x_m"), row.number("y_m"), row.number("z_m")};
    }
    return Optional.ofNullable(place);
  }

  List<Step> steps() {
    return steps;
  }

  /** {@return where the receiver truly is (m), if the log tells} */
  Optional<double[]> place() {
    return place;
  }
}

package dev.estimation.benchmarks.cases.uwb;

import dev.estimation.benchmarks.log.CsvRow;
import dev.estimation.benchmarks.log.CsvTable;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.InterpolatedTruth;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.benchmarks.replay.Truth;
import dev.estimation.filters.model.SensorModel;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The ranges of a log as steps, one for each distinct time, in file order. */
final class UwbLog {
  private static final double LARGEST_TRUTH_GAP = 0.5;
  private static final double LARGEST_TRUTH_DEVIATION = 0.05;
  private static final String TRUTH_DEVIATION = "std_xy_m";

  private final List<Step> steps = new ArrayList<>();
  private final Optional<Truth> truth;

  UwbLog(LogFolder log, SensorModel sensor, UwbSettings settings) {
    readSteps(log, anchors(log), sensor, settings);
    this.truth = readTruth(log);
  }

  private static Map<String, double[]> anchors(LogFolder log) {
    CsvTable table =
        CsvTable.read(log.file("anchors.csv"), "anchor_id", "x_m", "y_m", "z_m").requireRows();
    Map<String, double[]> anchors = new HashMap<>();
    for (CsvRow row : table.rows()) {
      double[] place = {row.number("x_m"), row.number("y_m"), row.number("z_m")};
      if (anchors.put(row.text("anchor_id"), place) != null) {
        throw row.error("anchor_id", "must be unique, got " + row.text("anchor_id") + " again");
      }
    }
    return anchors;
  }

  private void readSteps(
      LogFolder log, Map<String, double[]> anchors, SensorModel sensor, UwbSettings settings) {
    CsvTable table =
        CsvTable.read(log.file("ranges.csv"), "time_s", "anchor_id", "range_m").requireRows();
    List<Measurement> current = new ArrayList<>();
    double time = Double.NaN;
    for (CsvRow row : table.rows()) {
      double rowTime = row.number("time_s") - settings.lag();
      if (rowTime != time && !current.isEmpty()) {
        steps.add(new Step(time, current));
        current.clear();
      }
      time = rowTime;
      double[] range = {row.number("range_m") - settings.bias()};
      current.add(new Measurement(sensor, range, anchor(row, anchors)));
    }
    steps.add(new Step(time, current));
  }

  private static double[] anchor(CsvRow row, Map<String, double[]> anchors) {
    String name = row.text("anchor_id");
    double[] place = anchors.get(name);
    if (place == null) {
      throw row.error("anchor_id", "must be an anchor of anchors.csv, got " + name);
    }
    return place;
  }

  private static Optional<Truth> readTruth(LogFolder log) {
    CsvTable table = CsvTable.readIfPresent(log.file("groundtruth.csv"), "time_s", "x_m", "y_m");
    InterpolatedTruth.Builder truth = new InterpolatedTruth.Builder(LARGEST_TRUTH_GAP, 0, 1);
    boolean graded = table.hasColumn(TRUTH_DEVIATION);
    for (CsvRow row : table.rows()) {
      truth.add(
          row.number("time_s"), !graded || isGoodEnough(row), row.number("x_m"), row.number("y_m"));
    }
    return truth.build();
  }

  /** An empty cell tells nothing of the fix, which then does not count. */
  private static boolean isGoodEnough(CsvRow row) {
    return row.optionalNumber(TRUTH_DEVIATION).orElse(Double.POSITIVE_INFINITY)
        <= LARGEST_TRUTH_DEVIATION;
  }

  List<Step> steps() {
    return steps;
  }

  Optional<Truth> truth() {
    return truth;
  }
}

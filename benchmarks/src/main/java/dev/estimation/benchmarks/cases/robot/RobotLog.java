package dev.estimation.benchmarks.cases.robot;

import dev.estimation.benchmarks.log.CsvRow;
import dev.estimation.benchmarks.log.CsvTable;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.InterpolatedTruth;
import dev.estimation.benchmarks.replay.Truth;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The commands, sightings and true poses of a log, sorted by time; rows of equal time stay in file
 * order. Every row is read, also those that no step will use, so that a broken one is told wherever
 * it is.
 */
final class RobotLog {
  private static final double LARGEST_TRUTH_GAP = 0.35;
  private static final FlatSpace POSE = Space.reals(2).and(Space.angles(1));
  private static final String LANDMARK = "landmark_id";

  private final List<Command> commands = new ArrayList<>();
  private final List<Sighting> sightings = new ArrayList<>();
  private final InterpolatedTruth.Builder scoring = truth(LARGEST_TRUTH_GAP);
  private final InterpolatedTruth.Builder gapless = truth(Double.POSITIVE_INFINITY);
  private double lastTruthTime = Double.NEGATIVE_INFINITY;

  RobotLog(LogFolder log) {
    readCommands(log);
    readSightings(log, landmarks(log));
    readTruth(log);
    commands.sort(Comparator.comparingDouble(Command::time));
    sightings.sort(Comparator.comparingDouble(Sighting::time));
  }

  private static InterpolatedTruth.Builder truth(double largestGap) {
    return new InterpolatedTruth.Builder(largestGap, POSE, 0, 1, 2);
  }

  private void readCommands(LogFolder log) {
    CsvTable table = CsvTable.read(
            log.file("odometry.csv"),
            "time_s",
            "forward_velocity_m_per_s",
            "angular_velocity_rad_per_s")
        .requireRows();
    for (CsvRow row : table.rows()) {
      commands.add(new Command(
          row.number("time_s"),
          row.number("forward_velocity_m_per_s"),
          row.number("angular_velocity_rad_per_s")));
    }
  }

  private static Map<String, CsvRow> landmarks(LogFolder log) {
    CsvTable table = CsvTable.read(log.file("landmarks.csv"), LANDMARK, "x_m", "y_m");
    Map<String, CsvRow> landmarks = new HashMap<>();
    for (CsvRow row : table.rows()) {
      row.number("x_m"); // a landmark that is never seen must have a place too
      row.number("y_m");
      if (landmarks.put(row.text(LANDMARK), row) != null) {
        throw row.error(LANDMARK, "must be unique, got " + row.text(LANDMARK) + " again");
      }
    }
    return landmarks;
  }

  private void readSightings(LogFolder log, Map<String, CsvRow> landmarks) {
    CsvTable table =
        CsvTable.read(log.file("measurements.csv"), "time_s", LANDMARK, "range_m", "bearing_rad");
    for (CsvRow row : table.rows()) {
      CsvRow landmark = landmarks.get(row.text(LANDMARK));
      if (landmark == null) {
        throw row.error(LANDMARK, "must be a landmark of landmarks.csv, got " + row.text(LANDMARK));
      }
      sightings.add(new Sighting(
          row.number("time_s"),
          landmark.number("x_m"),
          landmark.number("y_m"),
          row.number("range_m"),
          row.number("bearing_rad")));
    }
  }

  private void readTruth(LogFolder log) {
    CsvTable table =
        CsvTable.readIfPresent(log.file("groundtruth.csv"), "time_s", "x_m", "y_m", "heading_rad");
    for (CsvRow row : table.rows()) {
      double time = row.number("time_s");
      double[] pose = {row.number("x_m"), row.number("y_m"), row.number("heading_rad")};
      scoring.add(time, true, pose);
      gapless.add(time, true, pose);
      lastTruthTime = Math.max(lastTruthTime, time);
    }
  }

  /** {@return the commands, one or more} */
  List<Command> commands() {
    return commands;
  }

  List<Sighting> sightings() {
    return sightings;
  }

  /** {@return the time of the last true pose; minus infinity if there is none} */
  double lastTruthTime() {
    return lastTruthTime;
  }

  /** {@return the truth to be scored against, which has holes where true poses are far apart} */
  Optional<Truth> truth() {
    return scoring.build();
  }

  /** {@return the true pose at a time, however far apart its neighbours are} */
  Optional<double[]> poseAt(double time) {
    double[] pose = new double[POSE.dimension()];
    return gapless.build().filter(truth -> truth.at(time, pose)).map(found -> pose);
  }
}

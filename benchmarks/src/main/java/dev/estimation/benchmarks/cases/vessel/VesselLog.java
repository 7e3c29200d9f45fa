package dev.estimation.benchmarks.cases.vessel;

import dev.estimation.benchmarks.log.CsvRow;
import dev.estimation.benchmarks.log.CsvTable;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.InterpolatedTruth;
import dev.estimation.benchmarks.replay.Truth;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The radar detections of labelled targets in a log: labels point to detections and scans, which
 * may stand in any order. Every label is followed, also those of other sensors, so that a broken
 * reference is told wherever it is.
 */
final class VesselLog {
  private static final String RADAR = "radar";
  private static final double LARGEST_TRUTH_GAP = 1.0;

  private final Map<Long, Scan> scans = new HashMap<>();
  private final Map<DetectionKey, CsvRow> detections = new HashMap<>();
  private final Map<Long, List<RadarPlot>> plots = new HashMap<>();
  private final Map<Long, InterpolatedTruth.Builder> truths = new HashMap<>();

  private record Scan(double time, boolean radar, double ownNorth, double ownEast) {}

  private record DetectionKey(long scan, long detection) {}

  VesselLog(LogFolder log) {
    readScans(log);
    readDetections(log);
    readLabels(log);
    readTruth(log);
  }

  private void readScans(LogFolder log) {
    CsvTable table = CsvTable.read(
        log.file("scans.csv"), "scan_id", "time_s", "sensor", "ownship_north_m", "ownship_east_m");
    for (CsvRow row : table.rows()) {
      Scan scan = new Scan(
          row.number("time_s"),
          row.text("sensor").equals(RADAR),
          row.number("ownship_north_m"),
          row.number("ownship_east_m"));
      if (scans.put(row.integer("scan_id"), scan) != null) {
        throw row.error("scan_id", "must be unique, got " + row.text("scan_id") + " again");
      }
    }
  }

  private void readDetections(LogFolder log) {
    CsvTable table = CsvTable.read(
        log.file("detections.csv"), "scan_id", "detection_id", "range_m", "bearing_rad");
    for (CsvRow row : table.rows()) {
      row.optionalNumber("range_m"); // cameras have none; anything but a number is an error
      row.optionalNumber("bearing_rad");
      if (detections.put(key(row), row) != null) {
        throw row.error(
            "detection_id",
            "must be unique within scan " + row.text("scan_id") + ", got "
                + row.text("detection_id") + " again");
      }
    }
  }

  private static DetectionKey key(CsvRow row) {
    return new DetectionKey(row.integer("scan_id"), row.integer("detection_id"));
  }

  private void readLabels(LogFolder log) {
    CsvTable table = CsvTable.read(log.file("labels.csv"), "scan_id", "detection_id", "target_id");
    for (CsvRow row : table.rows()) {
      DetectionKey key = key(row);
      long target = row.integer("target_id");
      Scan scan = scans.get(key.scan());
      if (scan == null) {
        throw row.error("scan_id", "must be a scan of scans.csv, got " + key.scan());
      }
      CsvRow detection = detections.get(key);
      if (detection == null) {
        throw row.error(
            "detection_id",
            "must be a detection of scan " + key.scan() + " in detections.csv, got "
                + key.detection());
      }
      if (scan.radar()) {
        plots.computeIfAbsent(target, any -> new ArrayList<>()).add(plot(key, scan, detection));
      }
    }
  }

  private static RadarPlot plot(DetectionKey key, Scan scan, CsvRow detection) {
    return new RadarPlot(
        scan.time(),
        key.scan(),
        scan.ownNorth(),
        scan.ownEast(),
        detection.number("range_m"),
        detection.number("bearing_rad"));
  }

  private void readTruth(LogFolder log) {
    CsvTable table = CsvTable.readIfPresent(
        log.file("groundtruth.csv"), "time_s", "target_id", "north_m", "east_m");
    for (CsvRow row : table.rows()) {
      truths
          .computeIfAbsent(
              row.integer("target_id"),
              any -> new InterpolatedTruth.Builder(LARGEST_TRUTH_GAP, 0, 1))
          .add(row.number("time_s"), true, row.number("north_m"), row.number("east_m"));
    }
  }

  /** {@return the detections of a target, sorted by time and scan} */
  List<RadarPlot> plots(long target) {
    List<RadarPlot> sorted = new ArrayList<>(plots.getOrDefault(target, List.of()));
    sorted.sort(Comparator.comparingDouble(RadarPlot::time).thenComparingLong(RadarPlot::scan));
    return sorted;
  }

  /** {@return the positions of a target, if there are any} */
  Optional<Truth> truth(long target) {
    return Optional.ofNullable(truths.get(target)).flatMap(InterpolatedTruth.Builder::build);
  }
}

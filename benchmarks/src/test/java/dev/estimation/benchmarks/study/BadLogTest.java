package dev.estimation.benchmarks.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever is wrong in a log is told with its file and, where it has one, its line and column. */
class BadLogTest {
  @TempDir
  private Path folder;

  private Path vessel;
  private Path uwb;
  private Path robot;
  private Path gnss;
  private Refusals refusals;

  @BeforeEach
  void makeLogs() throws IOException {
    vessel = SyntheticLog.vessel(folder.resolve("harbour"));
    uwb = SyntheticLog.uwb(folder.resolve("yard"));
    robot = SyntheticLog.robot(folder.resolve("hall"));
    gnss = SyntheticLog.gnss(folder.resolve("mast"));
    refusals = new Refusals(folder.resolve("out"));
  }

  @ParameterizedTest
  @CsvSource({
    "scans.csv, '30,3.6', '30,x', 'line 4|time_s'",
    "scans.csv, '30,3.6', '30,NaN', 'line 4|time_s|NaN'",
    "scans.csv, '30,3.6', '10,3.6', 'line 4|scan_id|unique'",
    "scans.csv, '3.6,radar,5,0', '3.6,radar,,0', 'line 4|ownship_north_m'",
    "scans.csv, 'sensor', 'device', 'line 1|sensor'",
    "detections.csv, '103,0.52', ',0.52', 'line 3|range_m'",
    "detections.csv, ',,0.52', ',far,0.52', 'line 4|range_m'",
    "detections.csv, '30,0,', '10,4,', 'line 3|detection_id|unique'",
    "labels.csv, '31,2,1', '32,2,1', 'line 4|scan_id|32'",
    "labels.csv, '31,2,1', '31,3,1', 'line 4|detection_id|3'",
    "labels.csv, '31,2,1', '31,2,one', 'line 4|target_id|one'",
    "groundtruth.csv, '3.5,1,99', '3.5,1,north', 'line 4|north_m|north'",
    "groundtruth.csv, 'north_m', 'y', 'line 1|north_m'"
  })
  void tellsWhereAVesselLogIsBroken(String file, String text, String by, String parts)
      throws IOException {
    SyntheticLog.spoil(vessel, file, text, by);
    assertRefused("vessel", vessel, (file + "|" + parts).split("\\|"));
  }

  @ParameterizedTest
  @CsvSource({
    "anchors.csv, 'B,0', 'A,0', 'line 3|anchor_id|unique'",
    "anchors.csv, '-8', 'Infinity', 'line 3|y_m|Infinity'",
    "ranges.csv, '1.5,B', '1.5,C', 'line 4|anchor_id|C'",
    "ranges.csv, '1.5,B,4.6', '1.5,B', 'line 4|cells'",
    "ranges.csv, 'range_m', 'distance', 'line 1|range_m'",
    "groundtruth.csv, '-2.4', '?', 'line 4|x_m|?'"
  })
  void tellsWhereAUwbLogIsBroken(String file, String text, String by, String parts)
      throws IOException {
    SyntheticLog.spoil(uwb, file, text, by);
    assertRefused("uwb", uwb, (file + "|" + parts).split("\\|"));
  }

  @ParameterizedTest
  @CsvSource({
    "odometry.csv, '1.5,0.2', '1.5,fast', 'line 3|forward_velocity_m_per_s|fast'",
    "odometry.csv, 'angular_velocity_rad_per_s', 'turn', 'line 1|angular_velocity_rad_per_s'",
    "landmarks.csv, 'L2', 'L1', 'line 3|landmark_id|unique'",
    "landmarks.csv, '0,4', '0,NaN', 'line 3|y_m|NaN'",
    "measurements.csv, '1.5,L1', '1.5,L3', 'line 3|landmark_id|L3'",
    "measurements.csv, '0.5,L1', '0.5,L3', 'line 2|landmark_id|L3'",
    "measurements.csv, '3.9,-0.05', '3.9,left', 'line 3|bearing_rad|left'",
    "measurements.csv, 'range_m', 'distance', 'line 1|range_m'",
    "groundtruth.csv, '1.2,0.04,0,0.02', '1.2,0.04,0,', 'line 3|heading_rad|empty'",
    "groundtruth.csv, 'heading_rad', 'yaw', 'line 1|heading_rad'"
  })
  void tellsWhereARobotLogIsBroken(String file, String text, String by, String parts)
      throws IOException {
    SyntheticLog.spoil(robot, file, text, by);
    assertRefused("robot", robot, (file + "|" + parts).split("\\|"));
  }

  @ParameterizedTest
  @CsvSource({
    "pseudoranges.csv, 'sat_y_m', 'y', 'line 1|sat_y_m'",
    "pseudoranges.csv, '30,S0,2.1999055E7', '30,S0,NaN', 'line 7|pseudorange_l1_m|NaN'",
    "pseudoranges.csv, '60,S1,2.1999055E7', '60,S1,', 'line 12|pseudorange_l1_m|empty'",
    "pseudoranges.csv, '1000,3,2,1.4', 'NaN,3,2,1.4', 'line 16|sat_clock_m|NaN'",
    "pseudoranges.csv, '3,2,1.4', '3,2,high', 'line 16|elevation_rad|high'",
    "truth.csv, '6371000', 'x', 'line 2|x_m|x'",
    "truth.csv, 'z_m', 'height', 'line 1|z_m'"
  })
  void tellsWhereAGnssLogIsBroken(String file, String text, String by, String parts)
      throws IOException {
    SyntheticLog.spoil(gnss, file, text, by);
    assertRefused("gnss", gnss, (file + "|" + parts).split("\\|"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"odometry.csv", "landmarks.csv", "measurements.csv"})
  void wantsTheFilesOfARobotLog(String file) throws IOException {
    Files.writeString(robot.resolve(file), "");
    assertRefused("robot", robot, file, "empty");
    Files.delete(robot.resolve(file));
    assertRefused("robot", robot, file, "not found");
  }

  @Test
  void wantsRowsOfAGnssLog() throws IOException {
    Path file = gnss.resolve("pseudoranges.csv");
    Files.writeString(file, Files.readAllLines(file).get(0) + "\n");
    assertRefused("gnss", gnss, "pseudoranges.csv", "no rows");
    Files.delete(file);
    assertRefused("gnss", gnss, "pseudoranges.csv", "not found");
  }

  @ParameterizedTest
  @ValueSource(strings = {"scans.csv", "detections.csv", "labels.csv"})
  void wantsTheFilesOfAVesselLog(String file) throws IOException {
    Files.writeString(vessel.resolve(file), "");
    assertRefused("vessel", vessel, file, "empty");
    Files.delete(vessel.resolve(file));
    assertRefused("vessel", vessel, file, "not found");
  }

  @ParameterizedTest
  @ValueSource(strings = {"anchors.csv", "ranges.csv"})
  void wantsTheFilesOfAUwbLog(String file) throws IOException {
    String header = Files.readAllLines(uwb.resolve(file)).get(0);
    Files.writeString(uwb.resolve(file), header + "\n");
    assertRefused("uwb", uwb, file, "no rows");
    Files.delete(uwb.resolve(file));
    assertRefused("uwb", uwb, file, "not found");
  }

  private void assertRefused(String caseName, Path log, String... parts) {
    refusals.assertRefused(refusals.replay(caseName, log), parts);
  }
}

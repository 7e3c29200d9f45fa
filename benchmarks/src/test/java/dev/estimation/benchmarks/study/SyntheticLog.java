package dev.estimation.benchmarks.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Small made-up logs in the layout of the recorded ones, to be spoilt by tests. */
final class SyntheticLog {
  private SyntheticLog() {}

  /** Target 1 alone, seen three times by radar and once by a camera; ids have gaps. */
  static Path vessel(Path folder) throws IOException {
    Files.createDirectories(folder);
    write(
        folder,
        "scans.csv",
        "scan_id,time_s,sensor,ownship_north_m,ownship_east_m,detection_count",
        "70,5.6,radar,10,0,1",
        "10,1.6,radar,0,0,1",
        "30,3.6,radar,5,0,1",
        "31,3.7,infrared,5,0,1");
    write(
        folder,
        "detections.csv",
        "scan_id,detection_id,range_m,bearing_rad",
        "10,4,100,0.50",
        "30,0,103,0.52",
        "31,2,,0.52",
        "70,9,106,0.51");
    write(
        folder,
        "labels.csv",
        "scan_id,detection_id,target_id",
        "70,9,1",
        "10,4,1",
        "31,2,1",
        "30,0,1");
    write(
        folder,
        "groundtruth.csv",
        "time_s,target_id,north_m,east_m",
        "2.5,1,95,50",
        "1.5,1,93,49",
        "3.5,1,99,52");
    return folder;
  }

  /** Two anchors and four ranges, two of them of one time. */
  static Path uwb(Path folder) throws IOException {
    Files.createDirectories(folder);
    write(folder, "anchors.csv", "anchor_id,x_m,y_m,z_m", "A,0,0,1.3", "B,0,-8,1.3");
    write(
        folder,
        "ranges.csv",
        "time_s,anchor_id,range_m",
        "1.0,A,4.7",
        "1.0,B,4.8",
        "1.5,B,4.6",
        "2.0,A,4.6");
    write(folder, "groundtruth.csv", "time_s,x_m,y_m", "0.5,-2.5,-4", "1.0,-2.5,-4", "1.5,-2.4,-4");
    return folder;
  }

  /** Six steps, the last one by a sighting; the second landmark is never seen. */
  static Path robot(Path folder) throws IOException {
    Files.createDirectories(folder);
    write(
        folder,
        "odometry.csv",
        "time_s,forward_velocity_m_per_s,angular_velocity_rad_per_s",
        "1.0,0.2,0.1",
        "1.5,0.2,0.1",
        "2.0,0.3,0.0");
    write(folder, "landmarks.csv", "landmark_id,x_m,y_m", "L1,4,0", "L2,0,4");
    write(
        folder,
        "measurements.csv",
        "time_s,landmark_id,range_m,bearing_rad",
        "0.5,L1,9,0",
        "1.5,L1,3.9,-0.05",
        "1.75,L1,3.85,-0.07",
        "1.8,L1,3.8,-0.07",
        "2.2,L1,3.7,-0.1",
        "2.4,L1,1,1");
    write(
        folder,
        "groundtruth.csv",
        "time_s,x_m,y_m,heading_rad",
        "0.9,0,0,0",
        "1.2,0.04,0,0.02",
        "1.5,0.1,0,0.05",
        "1.8,0.16,0.01,0.08",
        "2.3,0.3,0.02,0.1");
    return folder;
  }

  /** Four epochs of 5, 4, 6 and 5 satellites around the receiver at (6 371 000, 0, 0). */
  static Path gnss(Path folder) throws IOException {
    Files.createDirectories(folder);
    int[] satellites = {5, 4, 6, 5};
    List<String> lines = new ArrayList<>();
    lines.add("time_s,satellite_id,pseudorange_l1_m,sat_x_m,sat_y_m,sat_z_m,sat_clock_m,"
        + "ionosphere_model_m,troposphere_model_m,elevation_rad");
    for (int epoch = 0; epoch < satellites.length; epoch++) {
      for (int i = 0; i < satellites[epoch]; i++) {
        lines.add(pseudorange(30 * epoch, i, 0.4 + 0.2 * i));
      }
    }
    write(folder, "pseudoranges.csv", lines.toArray(new String[0]));
    write(folder, "truth.csv", "x_m,y_m,z_m", "6371000,0,0");
    return folder;
  }

  /** Exact, with a receiver clock of 50 m, for a satellite 22 000 km away. */
  private static String pseudorange(int time, int satellite, double elevation) {
    double up = 22e6 * Math.sin(elevation);
    double along = 22e6 * Math.cos(elevation);
    double azimuth = 1.3 * satellite;
    return time + ",S" + satellite + "," + (22e6 + 50 - 1000 + 3 + 2) + "," + (6371e3 + up) + ","
        + along * Math.cos(azimuth) + "," + along * Math.sin(azimuth) + ",1000,3,2," + elevation;
  }

  static void write(Path folder, String name, String... lines) throws IOException {
    Files.writeString(folder.resolve(name), String.join("\n", lines) + "\n");
  }

  /** Replaces text that must occur in a file. */
  static void spoil(Path folder, String name, String text, String by) throws IOException {
    Path file = folder.resolve(name);
    String content = Files.readString(file);
    if (!content.contains(text)) {
      throw new IllegalArgumentException(text + " does not occur in " + file);
    }
    Files.writeString(file, content.replace(text, by));
  }
}

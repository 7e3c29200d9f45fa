package dev.estimation.benchmarks.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

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

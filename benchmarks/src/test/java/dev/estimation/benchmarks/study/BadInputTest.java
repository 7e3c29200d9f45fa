package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever is wrong from outside is told in one line, with exit code 2 and nothing written. */
class BadInputTest {
  @TempDir
  private Path folder;

  private Path vessel;
  private Path uwb;
  private Path out;

  @BeforeEach
  void makeLogs() throws IOException {
    vessel = SyntheticLog.vessel(folder.resolve("harbour"));
    uwb = SyntheticLog.uwb(folder.resolve("yard"));
    out = folder.resolve("out");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        "rerun",
        "replay extra",
        "replay --nonsense",
        "replay --case",
        "replay --case ship",
        "replay --case vessel",
        "replay --case uwb",
        "replay --variant near",
        "replay --method spline",
        "replay --method hermite:1",
        "replay --method unscented:1,2,-3",
        "replay --lag 1",
        "replay --case demo --near-start 1,2",
        "replay --log somewhere"
      })
  void refusesBadOptions(String arguments) {
    String[] words = arguments.isEmpty() ? new String[0] : arguments.split(" ");
    if (words.length > 1) {
      assertRefused(with(words, "--out", out.toString()));
    } else {
      assertRefused((Object[]) words);
    }
  }

  private static Object[] with(String[] words, String... more) {
    Object[] all = new Object[words.length + more.length];
    System.arraycopy(words, 0, all, 0, words.length);
    System.arraycopy(more, 0, all, words.length, more.length);
    return all;
  }

  @Test
  void namesWhatWasWrongAndWhatWouldDo() {
    assertRefused(replay("vessel", vessel, "--variant", "near"), "near", "target1-cv");
    assertRefused(replay("uwb", uwb, "--variant", "target1-cv"), "target1-cv", "offset");
    assertRefused(replay("ship", vessel), "ship", "vessel, uwb, demo");
    assertRefused(replay("uwb", uwb, "--lag", "soon"), "--lag", "soon");
    assertRefused(replay("uwb", uwb, "--bias", "NaN"), "--bias", "NaN");
    assertRefused(replay("uwb", uwb, "--near-start", "1"), "--near-start", "X,Y");
    assertRefused(replay("uwb", uwb, "--near-start", "1,y"), "--near-start", "'y'");
    assertRefused(replay("vessel", vessel, "--height", "1"), "--height", "uwb");
    assertRefused(replay("vessel", vessel, "--method", "hermite:40"), "hermite:40", "target1-cv");
    assertRefused(replay("vessel", folder.resolve("none")), "none");
    assertRefused(replay("vessel", vessel.resolve("scans.csv")), "scans.csv");
    assertRefused(replay("vessel", ""), "log folder");
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
    assertRefused(replay("vessel", vessel), (file + "|" + parts).split("\\|"));
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
    assertRefused(replay("uwb", uwb), (file + "|" + parts).split("\\|"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"scans.csv", "detections.csv", "labels.csv"})
  void wantsTheFilesOfAVesselLog(String file) throws IOException {
    Files.writeString(vessel.resolve(file), "");
    assertRefused(replay("vessel", vessel), file, "empty");
    Files.delete(vessel.resolve(file));
    assertRefused(replay("vessel", vessel), file, "not found");
  }

  @ParameterizedTest
  @ValueSource(strings = {"anchors.csv", "ranges.csv"})
  void wantsTheFilesOfAUwbLog(String file) throws IOException {
    String header = Files.readAllLines(uwb.resolve(file)).get(0);
    Files.writeString(uwb.resolve(file), header + "\n");
    assertRefused(replay("uwb", uwb), file, "no rows");
    Files.delete(uwb.resolve(file));
    assertRefused(replay("uwb", uwb), file, "not found");
  }

  @Test
  void wantsAFolderToWriteTo() throws IOException {
    Path file = Files.createFile(folder.resolve("file"));
    assertRefused(new Object[] {"replay", "--out", file}, "file");
    assertRefused(new Object[] {"replay", "--out", file.resolve("below")}, "below");
    assertRefused(new Object[] {"replay", "--out", ""}, "results folder");
  }

  @Test
  void leavesNothingHalfWritten() throws IOException {
    Files.createDirectories(out.resolve("results.json").resolve("in the way"));
    assertRefused(replay("uwb", uwb, "--method", "linear"), "results.json");
    try (var entries = Files.list(out)) {
      assertEquals(1, entries.count());
    }
  }

  private Object[] replay(String caseName, Object log, String... more) {
    Object[] all = {"replay", "--case", caseName, "--log", log, "--out", out};
    Object[] whole = Arrays.copyOf(all, all.length + more.length);
    System.arraycopy(more, 0, whole, all.length, more.length);
    return whole;
  }

  private void assertRefused(Object[] arguments, String... parts) {
    StudyRun run = StudyRun.of(arguments);
    assertEquals(2, run.code(), run.err());
    assertEquals(1, run.err().lines().count(), run.err());
    assertTrue(run.err().startsWith("study: "), run.err());
    for (String part : parts) {
      assertTrue(run.err().contains(part), () -> "wanted '" + part + "' in " + run.err());
    }
    assertFalse(Files.isRegularFile(out.resolve("results.json")), "nothing may be written");
  }
}

package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever is wrong from outside is told in one line, with exit code 2 and nothing written. */
class BadInputTest {
  @TempDir
  private Path folder;

  private Path vessel;
  private Path uwb;
  private Path robot;
  private Path gnss;
  private Path out;
  private Refusals refusals;

  @BeforeEach
  void makeLogs() throws IOException {
    vessel = SyntheticLog.vessel(folder.resolve("harbour"));
    uwb = SyntheticLog.uwb(folder.resolve("yard"));
    robot = SyntheticLog.robot(folder.resolve("hall"));
    gnss = SyntheticLog.gnss(folder.resolve("mast"));
    out = folder.resolve("out");
    refusals = new Refusals(out);
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
        "replay --case robot",
        "replay --case gnss",
        "replay --variant near",
        "replay --method spline",
        "replay --method hermite:1",
        "replay --method unscented:1,2,-3",
        "replay --method random:5",
        "replay --whole-state --method random:5,1",
        "replay --method linear-iterated:damped",
        "replay --smooth=twice",
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
    assertRefused(replay("ship", vessel), "ship", "vessel, uwb, robot, gnss, demo");
    assertRefused(replay("robot", robot, "--variant", "far"), "far", "near, wide");
    assertRefused(replay("gnss", gnss, "--variant", "near"), "near", "far");
    assertRefused(
        replay("robot", robot, "--whole-state", "--method", "random:4,1"), "random:4,1", "near");
    assertRefused(replay("uwb", uwb, "--lag", "soon"), "--lag", "soon");
    assertRefused(replay("uwb", uwb, "--bias", "NaN"), "--bias", "NaN");
    assertRefused(replay("uwb", uwb, "--near-start", "1"), "--near-start", "X,Y");
    assertRefused(replay("uwb", uwb, "--near-start", "1,y"), "--near-start", "'y'");
    assertRefused(replay("vessel", vessel, "--height", "1"), "--height", "uwb");
    assertRefused(
        replay("vessel", vessel, "--whole-state", "--method", "hermite:40"),
        "hermite:40",
        "target1-cv");
    assertRefused(replay("vessel", folder.resolve("none")), "none");
    assertRefused(replay("vessel", vessel.resolve("scans.csv")), "scans.csv");
    assertRefused(replay("vessel", ""), "log folder");
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
    assertNothingAside();
  }

  @Test
  void leavesNoPageHalfWritten() throws IOException {
    Files.createDirectories(out.resolve("replay.html").resolve("in the way"));
    assertRefused(replay("uwb", uwb, "--method", "linear"), "replay.html");
    assertNothingAside();
  }

  @Test
  void leavesNoStepsHalfWritten() throws IOException {
    Files.createDirectories(out.resolve("steps-yard-linear.csv").resolve("in the way"));
    assertRefused(replay("uwb", uwb, "--method", "linear"), "steps-yard-linear.csv");
    assertNothingAside();
  }

  private void assertNothingAside() throws IOException {
    try (var entries = Files.list(out)) {
      assertEquals(
          0, entries.filter(entry -> entry.toString().endsWith(".part")).count());
    }
  }

  private Object[] replay(String caseName, Object log, String... more) {
    return refusals.replay(caseName, log, more);
  }

  private void assertRefused(Object[] arguments, String... parts) {
    refusals.assertRefused(arguments, parts);
  }
}

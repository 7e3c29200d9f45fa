package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Both forms of every method run on every case give the same estimates, and say which form they were. */
class SquareRootOptionTest {
  private static final String ITERATED = "linear-iterated:line-search";

  private static final List<String> METHODS = List.of(
      "linear",
      ITERATED,
      "linear-spread",
      "linear2-axes",
      "unscented:1,2,0",
      "unscented:1,0,3-n",
      "simplex",
      "cubature",
      "cubature5",
      "hermite:3",
      "sparse:3",
      "sobol:400");

  @TempDir
  private Path folder;

  /** 1e-9 standard deviations: rounding over a flight of 60 steps and more. */
  @Test
  void theSimulatedFlight() throws IOException {
    List<String> others =
        METHODS.stream().filter(method -> !method.equals(ITERATED)).toList();
    compare(others, 1e-9, "replay");
  }

  /**
   * An iteration ends when a step is below 1e-9 standard deviations of the prior, which rounding may decide a round sooner or later:
   * in the first update these are 4 km and afterwards some metres, so a round counts up to 1e-5 standard deviations.
   */
  @Test
  void theSimulatedFlightByIteration() throws IOException {
    compare(List.of(ITERATED, "simplex"), 1e-5, "replay");
  }

  @Test
  void ranges() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    compare(METHODS, 1e-9, "replay", "--case", "uwb", "--log", log);
  }

  /** Noise inside the motion, angles. */
  @Test
  void aRobot() throws IOException {
    Path log = SyntheticLog.robot(folder.resolve("hall"));
    compare(METHODS, 1e-9, "replay", "--case", "robot", "--log", log);
  }

  private void compare(List<String> methods, double limit, Object... words) throws IOException {
    JsonNode plain = run("plain", methods, words);
    List<Object> more = new ArrayList<>(List.of(words));
    more.add("--square-root");
    JsonNode root = run("root", methods, more.toArray());
    assertEquals(plain.size(), root.size());
    boolean anyBitDiffers = false;
    for (int i = 0; i < plain.size(); i++) {
      JsonNode wanted = plain.get(i);
      JsonNode got = root.get(i);
      String run = wanted.get("variant").asText() + " " + wanted.get("method").asText();
      assertFalse(wanted.get("squareRoot").asBoolean());
      assertTrue(got.get("squareRoot").asBoolean());
      for (String key : List.of("method", "smoothed", "status", "steps", "rejectedRows")) {
        assertEquals(wanted.get(key), got.get(key), run + ", " + key);
      }
      for (int c = 0; c < wanted.get("checkpoints").size(); c++) {
        double apart =
            distance(wanted.get("checkpoints").get(c), got.get("checkpoints").get(c));
        assertTrue(apart <= limit, run + ", checkpoint " + c + ": " + apart);
        anyBitDiffers |= apart > 0;
      }
    }
    assertTrue(anyBitDiffers, "another computation has other roundings");
  }

  private JsonNode run(String out, List<String> methods, Object... words) throws IOException {
    List<Object> all = new ArrayList<>(List.of(words));
    all.addAll(List.of("--smooth", "--out", folder.resolve(out)));
    methods.forEach(method -> all.addAll(List.of("--method", method)));
    StudyRun run = StudyRun.of(all.toArray());
    assertEquals(0, run.code(), run.err());
    String name = out.equals("root") ? "simplex square-root smoothed " : "simplex smoothed ";
    assertTrue(run.out().lines().anyMatch(line -> line.startsWith(name)), run.out());
    return StudyRun.results(folder.resolve(out)).get("runs");
  }

  private static double distance(JsonNode wanted, JsonNode got) {
    assertEquals(wanted.get("time"), got.get("time"));
    int n = wanted.get("mean").size();
    double largest = 0;
    for (int i = 0; i < n; i++) {
      double deviation = Math.sqrt(entry(wanted, i, i));
      double apart = wanted.at("/mean/" + i).asDouble() - got.at("/mean/" + i).asDouble();
      largest = Math.max(largest, Math.abs(apart / deviation));
      for (int j = 0; j <= i; j++) {
        double scale = deviation * Math.sqrt(entry(wanted, j, j));
        double entries = entry(wanted, i, j) - entry(got, i, j);
        largest = Math.max(largest, Math.abs(entries / scale));
      }
    }
    return largest;
  }

  private static double entry(JsonNode estimate, int row, int column) {
    return estimate.at("/covariance/" + row + "/" + column).asDouble();
  }

  @Test
  void withoutItNothingChanges() throws IOException {
    assertEquals(0, StudyRun.of("replay", "--out", folder, "--method", "linear").code());
    JsonNode run = StudyRun.results(folder).at("/runs/0");
    assertFalse(run.get("squareRoot").asBoolean());
    assertNotEquals("", run.get("status").asText());
  }
}

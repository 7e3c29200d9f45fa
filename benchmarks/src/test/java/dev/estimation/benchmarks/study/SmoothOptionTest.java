package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SmoothOptionTest {
  @TempDir
  private Path folder;

  @Test
  void eachRunIsFollowedByItsSmoothedTrack() throws IOException {
    StudyRun run = StudyRun.of(
        "replay", "--smooth", "--out", folder, "--method", "hermite:3", "--method", "cubature");
    assertEquals(0, run.code(), run.err());
    JsonNode runs = StudyRun.results(folder).get("runs");
    assertEquals(4, runs.size());
    for (int i = 0; i < 4; i += 2) {
      assertPair(runs.get(i), runs.get(i + 1));
    }
    assertEquals("cubature", runs.get(3).get("method").asText());
    assertTrue(run.out().lines().anyMatch(line -> line.startsWith("hermite:3 smoothed ")));
  }

  private static void assertPair(JsonNode filtered, JsonNode smoothed) {
    assertFalse(filtered.get("smoothed").asBoolean());
    assertTrue(smoothed.get("smoothed").asBoolean());
    for (String key : List.of("label", "variant", "method", "wholeState", "status", "steps")) {
      assertEquals(filtered.get(key), smoothed.get(key), key);
    }
    for (String key : List.of("rejectedRows", "logLikelihood", "nis")) {
      assertFalse(filtered.get(key).isNull(), key);
      assertTrue(smoothed.get(key).isNull(), key);
    }
    assertEquals(0, smoothed.get("evaluations").asInt());
    assertEquals(0, smoothed.get("jacobians").asInt());
    assertTrue(smoothed.get("nanosPerStep").asDouble() > 0);
    assertEquals(names(filtered), names(smoothed));
    // Later measurements help: that is the point of smoothing.
    assertTrue(rmse(smoothed) < rmse(filtered));
    assertEquals(filtered.get("final"), smoothed.get("final"), "nothing comes after the last step");
    assertNotEquals(filtered.at("/checkpoints/0"), smoothed.at("/checkpoints/0"));
    assertEquals(filtered.at("/checkpoints/0/time"), smoothed.at("/checkpoints/0/time"));
  }

  private static double rmse(JsonNode run) {
    return run.at("/scores/position/rmse").asDouble();
  }

  private static List<String> names(JsonNode run) {
    List<String> names = new ArrayList<>();
    run.fieldNames().forEachRemaining(names::add);
    return names;
  }

  @Test
  void smoothingLeavesTheFilterAsItIs() throws IOException {
    JsonNode alone = withoutTimes("a", "replay", "--method", "linear");
    JsonNode followed = withoutTimes("b", "replay", "--method", "linear", "--smooth");
    assertEquals(alone.get("runs").get(0), followed.get("runs").get(0));
  }

  @Test
  void anAbsentVariantIsAbsentTwice() throws IOException {
    Path log = SyntheticLog.gnss(folder.resolve("mast"));
    Files.delete(log.resolve("truth.csv"));
    JsonNode runs = withoutTimes(
            "out", "replay", "--case", "gnss", "--log", log, "--smooth", "--method", "linear")
        .get("runs");
    assertEquals(2, runs.size());
    assertTrue(runs.get(1).get("smoothed").asBoolean());
    assertEquals(runs.get(0).get("status"), runs.get(1).get("status"));
    assertEquals(names(runs.get(0)), names(runs.get(1)));
  }

  /** Bit for bit, since numbers are written with all their digits. */
  @Test
  void randomDrawsAreTheSameEachTime() throws IOException {
    String[] demo = {"replay", "--method", "random:2000,5", "--smooth"};
    JsonNode first = withoutTimes("a", (Object[]) demo);
    JsonNode second = withoutTimes("b", (Object[]) demo);
    JsonNode otherSeed = withoutTimes("c", "replay", "--method", "random:2000,6", "--smooth");
    assertEquals("ok", first.at("/runs/0/status").asText());
    assertEquals(first.toString(), second.toString());
    assertNotEquals(first.at("/runs/0/final"), otherSeed.at("/runs/0/final"));
  }

  private JsonNode withoutTimes(String out, Object... arguments) throws IOException {
    Path target = folder.resolve(out);
    List<Object> words = new ArrayList<>(List.of(arguments));
    words.addAll(List.of("--out", target));
    StudyRun run = StudyRun.of(words.toArray());
    assertEquals(0, run.code(), run.err());
    JsonNode results = StudyRun.results(target);
    results.get("runs").forEach(node -> ((ObjectNode) node).remove("nanosPerStep"));
    return results;
  }
}

package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ReplayCommandTest {
  private static final List<String> RUN_KEYS = List.of(
      "label",
      "variant",
      "method",
      "wholeState",
      "squareRoot",
      "smoothed",
      "status",
      "stepsFile",
      "steps",
      "stepsBelowTolerance",
      "evaluations",
      "jacobians",
      "nanosPerStep",
      "rejectedRows",
      "logLikelihood",
      "scores",
      "nees",
      "nis",
      "final",
      "checkpoints");

  @TempDir
  private Path folder;

  @Test
  void theDemoRunsWithAllMethodsWhenNothingIsAskedFor() throws IOException {
    Path out = folder.resolve("a/b");
    StudyRun run = StudyRun.of("replay", "--out", out);
    assertEquals(0, run.code(), run.err());
    JsonNode results = StudyRun.results(out);
    assertEquals("demo", results.get("case").asText());
    assertTrue(results.get("log").isNull());
    assertEquals(MethodParser.DEFAULT, values(results, "method"));
    assertEquals(List.of("demo"), values(results, "label").stream().distinct().toList());
    for (String method : MethodParser.DEFAULT) {
      assertTrue(run.out().lines().anyMatch(line -> line.startsWith(method)), run.out());
    }
    double upper = 9.348; // chi-square, 3 degrees of freedom, 97.5 %
    assertTrue(results.at("/runs/0/nees/mean").asDouble() > upper);
    assertTrue(results.at("/runs/5/nees/mean").asDouble() < upper);
  }

  @Test
  void resultsHaveTheirShape() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    StudyRun run = StudyRun.of("replay", "--case", "uwb", "--log", log + "/", "--out", folder);
    assertEquals(0, run.code(), run.err());
    JsonNode results = StudyRun.results(folder);
    assertEquals(log + "/", results.get("log").asText());
    assertEquals(18, results.get("runs").size());
    for (JsonNode node : results.get("runs")) {
      List<String> keys = new ArrayList<>();
      node.fieldNames().forEachRemaining(keys::add);
      assertEquals(RUN_KEYS, keys);
    }
    JsonNode first = results.at("/runs/0");
    assertEquals("yard", first.get("label").asText());
    assertEquals("ok", first.get("status").asText());
    assertEquals(3, first.get("steps").asInt());
    assertEquals(6, first.get("jacobians").asInt());
    assertEquals(4, first.at("/final/covariance").size());
    assertEquals(4, first.at("/final/covariance/3").size());
    assertEquals(1.8, first.at("/final/time").asDouble(), 1e-12);
    assertEquals(3, first.get("checkpoints").size());
    assertEquals(2, first.at("/nees/degreesOfFreedom").asInt());
    assertTrue(first.at("/scores/position/rmse").isDouble());
    assertTrue(first.get("nanosPerStep").asDouble() > 0);
    assertEquals("yard-offset-start", results.at("/runs/6/label").asText());
    assertEquals("yard-cold-start", results.at("/runs/12/label").asText());
  }

  @Test
  void whatIsAskedForIsRun() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    StudyRun run = StudyRun.of(
        "replay",
        "--case",
        "uwb",
        "--log",
        log,
        "--out",
        folder,
        "--whole-state",
        "--variant",
        "cold",
        "--variant",
        "near",
        "--method",
        "unscented:1,0,4-n",
        "--method",
        "linear",
        "--method",
        "linear",
        "--near-start",
        "-2,-3",
        "--lag",
        "-0.5",
        "--bias",
        "1e-1");
    assertEquals(0, run.code(), run.err());
    JsonNode results = StudyRun.results(folder);
    assertEquals(List.of("cold", "cold", "near", "near"), values(results, "variant"));
    assertEquals(
        List.of("unscented:1,0,4-n", "linear", "unscented:1,0,4-n", "linear"),
        values(results, "method"));
    assertTrue(results.at("/runs/0/wholeState").asBoolean());
    assertEquals(2.5, results.at("/runs/0/final/time").asDouble(), 1e-12);
  }

  @Test
  void headingsHaveColumnsWhereTruthTellsThem() throws IOException {
    Path log = SyntheticLog.robot(folder.resolve("hall"));
    StudyRun robot = StudyRun.of("replay", "--case", "robot", "--log", log, "--out", folder);
    assertEquals(0, robot.code(), robot.err());
    assertTrue(robot.out().contains("error (rad)"), robot.out());
    assertTrue(robot.out().contains("of the position and heading, 3 degrees"), robot.out());
    JsonNode runs = StudyRun.results(folder).get("runs");
    assertEquals("hall", runs.at("/0/label").asText());
    assertEquals("hall-wide-start", runs.at("/6/label").asText());
    assertTrue(runs.at("/0/scores/heading/rmse").isDouble());
    StudyRun demo = StudyRun.of("replay", "--out", folder, "--method", "linear");
    assertFalse(demo.out().contains("error (rad)"), demo.out());
    assertFalse(StudyRun.results(folder).at("/runs/0/scores").has("heading"));
  }

  @Test
  void anEarlierFileIsReplacedAndNothingElseIsLeft() throws IOException {
    Path out = Files.createDirectory(folder.resolve("out"));
    Files.writeString(out.resolve("results.json"), "old");
    assertEquals(0, StudyRun.of("replay", "--out", out, "--method", "linear").code());
    assertEquals(1, StudyRun.results(out).get("runs").size());
    try (var entries = Files.list(out)) {
      assertEquals(
          List.of("replay.html", "results.json", "steps-demo-linear.csv"),
          entries.map(entry -> entry.getFileName().toString()).sorted().toList());
    }
  }

  @Test
  void helpIsShown() {
    StudyRun run = StudyRun.of("replay", "--help");
    assertEquals(0, run.code());
    assertTrue(run.out().contains("--whole-state"));
    assertTrue(run.out().contains("--square-root"));
    assertFalse(Files.exists(folder.resolve("results")));
  }

  private static List<String> values(JsonNode results, String key) {
    List<String> values = new ArrayList<>();
    results.get("runs").forEach(run -> values.add(run.get(key).asText()));
    return values;
  }
}

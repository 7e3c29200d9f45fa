package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Logs that lack something, or on which a filter fails, give results that say so. */
class UnusualLogTest {
  @TempDir
  private Path folder;

  @Test
  void withoutTruthThereAreNoScores() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    Files.delete(log.resolve("groundtruth.csv"));
    JsonNode run = firstRun("uwb", log, "near");
    assertEquals("ok", run.get("status").asText());
    assertTrue(run.at("/scores/position").isNull());
    assertTrue(run.get("nees").isNull());
    assertTrue(run.at("/nis/meanPerDegree").isDouble());
  }

  @Test
  void aPoorFixIsNoTruth() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    SyntheticLog.write(
        log,
        "groundtruth.csv",
        "time_s,x_m,y_m,std_xy_m",
        "0.5,-2,-4,0.05",
        "1,-2,-4,0.051",
        "1.5,-2,-4,0.01",
        "2,-2,-4,");
    assertTrue(firstRun("uwb", log, "near").get("nees").isNull());
  }

  @Test
  void aTargetThatDoesNotOccurIsAResult() throws IOException {
    Path log = SyntheticLog.vessel(folder.resolve("harbour"));
    JsonNode absent = firstRun("vessel", log, "target2-ct");
    assertEquals("harbour-target2-ct", absent.get("label").asText());
    assertTrue(absent.get("status").asText().contains("target 2"));
    assertEquals(0, absent.get("steps").asInt());
    assertTrue(absent.get("logLikelihood").isNull());
    assertTrue(absent.get("final").isNull());
    assertTrue(absent.get("nees").isNull());
    assertTrue(absent.at("/scores/position").isNull());
    assertEquals(0, absent.get("checkpoints").size());
  }

  /** The first detection starts the track; the later two are steps, in order of time. */
  @Test
  void aVesselLogMayStandInAnyOrder() throws IOException {
    Path log = SyntheticLog.vessel(folder.resolve("harbour"));
    JsonNode run = firstRun("vessel", log, "target1-cv");
    assertEquals("ok", run.get("status").asText());
    assertEquals(3, run.get("steps").asInt());
    assertEquals(4, run.get("jacobians").asInt());
    assertEquals(0, run.at("/checkpoints/0/time").asDouble(), 1e-12);
    assertEquals(100 * Math.cos(0.5), run.at("/checkpoints/0/mean/0").asDouble(), 1e-12);
    assertEquals(4, run.at("/final/time").asDouble(), 1e-12);
  }

  @Test
  void timeThatGoesBackIsAResult() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    SyntheticLog.spoil(log, "ranges.csv", "2.0,A", "1.4,A");
    JsonNode run = firstRun("uwb", log, "near");
    assertTrue(run.get("status").asText().startsWith("step 2 at t = 1.2 s failed: "));
    assertEquals(2, run.get("steps").asInt());
    assertEquals(1.3, run.at("/final/time").asDouble(), 1e-12);
  }

  @Test
  void aRunThatFailsAtOnceHasNoNumbers() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    SyntheticLog.spoil(log, "anchors.csv", "A,0,0", "A,1e300,0");
    JsonNode run = firstRun("uwb", log, "near");
    assertTrue(
        run.get("status").asText().startsWith("step 0 "), run.get("status").asText());
    assertEquals(0, run.get("steps").asInt());
    assertTrue(run.get("final").isNull());
    assertTrue(run.get("nis").isNull());
    assertTrue(run.get("nanosPerStep").isNull());
    assertTrue(run.get("logLikelihood").isNull());
  }

  @Test
  void aRobotLogWithoutTruthHasNoStart() throws IOException {
    Path log = SyntheticLog.robot(folder.resolve("hall"));
    Files.delete(log.resolve("groundtruth.csv"));
    assertNoStart(firstRun("robot", log, "wide"), "hall-wide-start", "groundtruth.csv");
  }

  @Test
  void aGnssLogWithoutTruthHasNoStart() throws IOException {
    Path log = SyntheticLog.gnss(folder.resolve("mast"));
    Files.delete(log.resolve("truth.csv"));
    assertNoStart(firstRun("gnss", log, "far"), "mast", "truth.csv");
  }

  private static void assertNoStart(JsonNode run, String label, String file) {
    assertEquals(label, run.get("label").asText());
    assertTrue(run.get("status").asText().startsWith("no start: " + file));
    assertEquals(0, run.get("steps").asInt());
    for (String key : List.of("evaluations", "logLikelihood", "nees", "nis", "final")) {
      assertTrue(run.get(key).isNull(), key);
    }
    assertTrue(run.at("/scores/position").isNull());
  }

  /** The steps are at 1, 1.5, 1.75, 1.8, 2 and 2.2 s; before and after there is no truth to start or end. */
  @Test
  void aRobotLogOfAnySizeIsRun() throws IOException {
    JsonNode run = firstRun("robot", SyntheticLog.robot(folder.resolve("hall")), "near");
    assertEquals("ok", run.get("status").asText());
    assertEquals(6, run.get("steps").asInt());
    assertEquals(9, run.get("jacobians").asInt(), "5 predictions and 4 sightings");
    assertEquals(2.2, run.at("/final/time").asDouble(), 0);
    assertEquals(3, run.at("/final/covariance").size());
    assertEquals(3, run.at("/nees/degreesOfFreedom").asInt());
    assertTrue(run.at("/scores/position/rmse").asDouble() < 0.4);
    assertTrue(run.at("/scores/heading/max").asDouble() < 0.3);
  }

  /** Without sightings nothing corrects the start, so the errors are its offset. */
  @Test
  void aRobotMaySeeNothing() throws IOException {
    Path log = SyntheticLog.robot(folder.resolve("hall"));
    SyntheticLog.write(log, "measurements.csv", "time_s,landmark_id,range_m,bearing_rad");
    JsonNode run = firstRun("robot", log, "near");
    assertEquals("ok", run.get("status").asText());
    assertEquals(3, run.get("steps").asInt());
    assertTrue(run.get("logLikelihood").isNull());
    assertEquals(0.1, run.at("/checkpoints/0/mean/2").asDouble() - 0.02 / 3, 1e-15);
  }

  /** The measurements are exact, so the iterated update finds the place but for the start's pull. */
  @Test
  void aGnssLogOfAnySizeIsRun() throws IOException {
    Path log = SyntheticLog.gnss(folder.resolve("mast"));
    JsonNode run = runs("gnss", log, "far", "linear-iterated").get(0);
    assertEquals("ok", run.get("status").asText());
    assertEquals(4, run.get("steps").asInt());
    assertEquals(90, run.at("/final/time").asDouble(), 0);
    assertEquals(3, run.at("/nees/degreesOfFreedom").asInt());
    assertTrue(run.at("/scores/position/max").asDouble() < 0.01);
    assertEquals(50, run.at("/final/mean/3").asDouble(), 0.01);
  }

  private JsonNode firstRun(String caseName, Path log, String variant) throws IOException {
    return runs(caseName, log, variant, "linear").get(0);
  }

  private JsonNode runs(String caseName, Path log, String variant, String method)
      throws IOException {
    StudyRun run = StudyRun.of(
        "replay",
        "--case",
        caseName,
        "--log",
        log,
        "--variant",
        variant,
        "--method",
        method,
        "--out",
        folder);
    assertEquals(0, run.code(), run.err());
    return StudyRun.results(folder).get("runs");
  }
}

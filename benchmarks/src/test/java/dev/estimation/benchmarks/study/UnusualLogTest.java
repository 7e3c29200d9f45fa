package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
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

  private JsonNode firstRun(String caseName, Path log, String variant) throws IOException {
    StudyRun run = StudyRun.of(
        "replay",
        "--case",
        caseName,
        "--log",
        log,
        "--variant",
        variant,
        "--method",
        "linear",
        "--out",
        folder);
    assertEquals(0, run.code(), run.err());
    return StudyRun.results(folder).at("/runs/0");
  }
}

package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SweepCommandTest {
  @TempDir
  private Path folder;

  private JsonNode sweep(int threads) throws IOException {
    StudyRun run = StudyRun.of(
        "sweep",
        "--noise-scale",
        "1,2",
        "--extra-lag=-5,0",
        "--method",
        "hermite:3",
        "--method",
        "unscented:1,2,0",
        "--threads",
        threads,
        "--out",
        folder);
    assertEquals(0, run.code(), run.err());
    return new ObjectMapper().readTree(folder.resolve("sweep.json").toFile());
  }

  @Test
  void everyCombinationIsRunAndTheNumberOfThreadsChangesNothing() throws IOException {
    JsonNode one = sweep(1);
    assertEquals(one, sweep(4));
    assertEquals(8, one.get("runs").size());
    JsonNode late = one.at("/runs/0");
    JsonNode onTime = one.at("/runs/4");
    assertEquals(-5, late.get("extraLag").asDouble(), 0);
    assertEquals(1, onTime.get("noiseScale").asDouble(), 0);
    // The filter knows no clock: a lag moves its track against the truth, nothing else.
    assertEquals(late.get("logLikelihood"), onTime.get("logLikelihood"));
    assertNotEquals(late.at("/scores/position/rmse"), onTime.at("/scores/position/rmse"));
    assertNotEquals(onTime.get("logLikelihood"), one.at("/runs/6/logLikelihood"), "noise counts");
    assertFalse(onTime.has("nanosPerStep"));
  }

  @Test
  void withoutChangesItIsTheReplay() throws IOException {
    assertEquals(
        0, StudyRun.of("sweep", "--method", "cubature", "--out", folder).code());
    JsonNode swept = new ObjectMapper().readTree(folder.resolve("sweep.json").toFile());
    assertEquals(
        0, StudyRun.of("replay", "--method", "cubature", "--out", folder).code());
    JsonNode replayed = StudyRun.results(folder);
    for (String key : new String[] {"final", "scores", "nees", "evaluations", "logLikelihood"}) {
      assertEquals(replayed.at("/runs/0").get(key), swept.at("/runs/0").get(key), key);
    }
  }
}

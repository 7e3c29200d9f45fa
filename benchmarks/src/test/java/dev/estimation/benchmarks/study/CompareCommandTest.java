package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CompareCommandTest {
  private static final String RUNS = """
      {"case": "demo", "log": null, "runs": [{"label": "demo", "variant": "flight", "method": "m", "wholeState": false,
        "squareRoot": false, "smoothed": false, "status": "ok", "evaluations": 100,
        "scores": {"position": {"rmse": 10.0, "max": 20.0}}, "nees": {"degreesOfFreedom": 3, "mean": 2.5},
        "nis": {"meanPerDegree": 1.1}}]}""";
  private static final String WEIGHT = """
      {"case": "demo", "log": null, "tolerance": 0.01, "track": "hermite:5", "weighings": [{"label": "demo",
        "variant": "flight", "noiseScale": 1.0, "recommendation": {"method": "m", "suffices": true},
        "functions": [{"name": "Range", "methods": [{"method": "m", "serves": true,
          "error": {"median": 1e-9, "ninetyPercent": 1e-3, "ninetyNinePercent": 0.004, "largest": 0.1},
          "shareAbove": 0.005, "evaluations": {"median": 5}, "jacobians": {"median": 0}, "microseconds": 1.0}]}]}]}""";

  @TempDir
  private Path folder;

  private Path old;
  private Path fresh;

  @BeforeEach
  void name() {
    old = folder.resolve("old.json");
    fresh = folder.resolve("new.json");
  }

  /** Compares a text with itself, some of it replaced. */
  private StudyRun compare(String text, String part, String by, String... more) throws IOException {
    assertTrue(text.contains(part), part);
    Files.writeString(old, text);
    Files.writeString(fresh, text.replace(part, by));
    Object[] words = new Object[3 + more.length];
    words[0] = "compare";
    words[1] = old;
    words[2] = fresh;
    System.arraycopy(more, 0, words, 3, more.length);
    return StudyRun.of(words);
  }

  private static void assertLosses(int losses, StudyRun run) {
    assertEquals(losses == 0 ? 0 : 1, run.code(), run.out() + run.err());
    assertEquals(
        losses, run.out().lines().filter(line -> line.startsWith("LOSS ")).count(), run.out());
  }

  @Test
  void worseAccuracyIsALossAndBetterIsNone() throws IOException {
    assertLosses(0, compare(RUNS, "10.0", "10.0"));
    assertLosses(0, compare(RUNS, "10.0", "9.0"));
    assertLosses(0, compare(RUNS, "10.0", "10.4"));
    assertLosses(1, compare(RUNS, "10.0", "10.6"));
    assertLosses(1, compare(RUNS, "10.0", "10.4", "--allow=0.01"));
    assertLosses(1, compare(RUNS, "\"ok\"", "\"step 3 failed\""));
    assertLosses(1, compare(RUNS, "{\"rmse\": 10.0,", "{\"rmse\": null,"));
    assertLosses(5, compare(RUNS, "\"method\": \"m\"", "\"method\": \"other\""));
  }

  /** Away from the honest value is worse, on whichever side. */
  @Test
  void dishonestyIsALoss() throws IOException {
    assertLosses(0, compare(RUNS, "2.5", "3.1"));
    assertLosses(1, compare(RUNS, "2.5", "4.0"));
    assertLosses(1, compare(RUNS, "2.5", "2.0"));
    assertLosses(1, compare(RUNS, "1.1", "0.8"));
  }

  @Test
  void costIsToldAndIsNoLoss() throws IOException {
    StudyRun run = compare(RUNS, "100", "200");
    assertLosses(0, run);
    assertTrue(run.out().contains("evaluations 100.000 -> 200.000"), run.out());
    assertLosses(0, compare(WEIGHT, "\"microseconds\": 1.0", "\"microseconds\": 9.0"));
  }

  @Test
  void weighingsAreCompared() throws IOException {
    assertLosses(0, compare(WEIGHT, "0.1", "0.1"));
    assertLosses(0, compare(WEIGHT, "1e-9", "1e-5"));
    assertLosses(1, compare(WEIGHT, "0.004", "0.005"));
    assertLosses(1, compare(WEIGHT, "\"largest\": 0.1", "\"largest\": null"));
    assertLosses(1, compare(WEIGHT, "\"shareAbove\": 0.005", "\"shareAbove\": 0.006"));
    assertLosses(
        1, compare(WEIGHT, "{\"method\": \"m\", \"suffices\"", "{\"method\": null, \"suffices\""));
    assertLosses(6, compare(WEIGHT, "\"serves\": true", "\"serves\": false"));
  }

  private void assertRefused(String part, Object... words) {
    StudyRun run = StudyRun.of(words);
    assertEquals(2, run.code(), run.out());
    assertEquals(1, run.err().lines().count(), run.err());
    assertTrue(run.err().contains(part), run.err());
  }

  @Test
  void badInputIsRefused() throws IOException {
    Files.writeString(old, RUNS);
    assertRefused("none.json", "compare", old, folder.resolve("none.json"));
    assertRefused("NEW", "compare", old);
    Files.writeString(fresh, RUNS.replace("\"case\": \"demo\"", "\"case\": \"uwb\""));
    assertRefused("uwb", "compare", old, fresh);
    Files.writeString(fresh, WEIGHT);
    assertRefused("tolerance", "compare", old, fresh);
    Files.writeString(fresh, "");
    assertRefused("new.json", "compare", old, fresh);
    Files.writeString(fresh, "{\"case\": \"demo\"");
    assertRefused("new.json", "compare", old, fresh);
    Files.writeString(fresh, "{\"case\": \"demo\", \"runs\": []}");
    assertRefused("no results", "compare", old, fresh);
    assertRefused("--allow", "compare", old, old, "--allow=-1");
    assertRefused("--allow", "compare", old, old, "--allow=much");
  }
}

package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class WeighCommandTest {
  @TempDir
  private Path folder;

  private JsonNode weigh(Object... more) throws IOException {
    List<Object> words = new ArrayList<>(List.of("weigh", "--out", folder));
    words.addAll(List.of(more));
    StudyRun run = StudyRun.of(words.toArray());
    assertEquals(0, run.code(), run.err());
    return new ObjectMapper().readTree(folder.resolve("weigh.json").toFile());
  }

  @Test
  void theDemoIsWeighedWhenNothingIsAskedFor() throws IOException {
    JsonNode demo = weigh("--every", "15").at("/weighings/0");
    assertEquals("flight", demo.get("variant").asText());
    assertEquals("ok", demo.get("status").asText());
    assertEquals("ConstantVelocity", demo.at("/functions/0/name").asText());
    assertEquals("prediction", demo.at("/functions/0/use").asText());
    assertEquals(6, demo.at("/functions/1/points").asInt());
    assertEquals(3, demo.at("/functions/1/nonlinearInputs").asInt());
    JsonNode linear = demo.at("/functions/1/methods/0");
    assertEquals("linear", linear.get("method").asText());
    assertEquals(1, linear.get("shareAbove").asDouble(), 0, "everywhere");
    assertTrue(linear.get("microseconds").asDouble() > 0);
    assertTrue(demo.at("/recommendation/suffices").asBoolean());
    assertFalse(demo.at("/recommendation/method").asText().equals("linear"));
    try (var entries = Files.list(folder)) {
      assertEquals(1, entries.count(), "nothing is left aside");
    }
  }

  @Test
  void theNumberOfThreadsChangesNothing() throws IOException {
    Object[] words = {"--untimed", "--to", "30", "--noise-scale", "0.5,1,2", "--threads"};
    JsonNode one = weigh(with(words, 1));
    JsonNode four = weigh(with(words, 4));
    assertEquals(one, four);
    assertEquals(3, one.get("weighings").size());
    assertEquals(2, one.at("/weighings/2/noiseScale").asDouble(), 0);
    assertTrue(one.at("/weighings/0/functions/1/methods/0/microseconds").isNull());
  }

  private static Object[] with(Object[] words, Object last) {
    List<Object> all = new ArrayList<>(List.of(words));
    all.add(last);
    return all.toArray();
  }

  @Test
  void aBudgetAloneTakesTheMostAccurateWithinIt() throws IOException {
    JsonNode generous =
        weigh("--to", "2", "--budget-us", "1e6", "--method", "linear", "--method", "hermite:3");
    assertEquals("hermite:3", generous.at("/weighings/0/recommendation/method").asText());
    JsonNode none = weigh("--to", "2", "--budget-us", "1e-6", "--method", "linear");
    assertTrue(none.at("/weighings/0/recommendation/method").isNull());
  }

  @Test
  void rowsAreLeftOut() throws IOException {
    Path log = SyntheticLog.gnss(folder.resolve("mast"));
    JsonNode weighing = weigh(
            "--case", "gnss", "--log", log, "--rows", "4", "--untimed", "--method", "linear")
        .at("/weighings/0");
    assertEquals("Pseudorange", weighing.at("/functions/1/name").asText());
    assertEquals(4, weighing.at("/functions/1/points").asInt());
  }

  @Test
  void toldPointsAreWeighed() throws IOException {
    Path points = folder.resolve("points.csv");
    String head = "step,mean_0,mean_1,mean_2,mean_3,mean_4,mean_5,"
        + "deviation_0,deviation_1,deviation_2,deviation_3,deviation_4,deviation_5\n";
    Files.writeString(
        points,
        head
            + "5,18000,24000,8000,0,0,0,1,1,1,1,1,1\n6,18000,24000,8000,0,0,0,9000,9000,9000,1,1,1\n");
    StudyRun run = StudyRun.of(
        "weigh", "--points", points, "--untimed", "--method", "linear", "--out", folder);
    assertEquals(0, run.code(), run.err());
    JsonNode linear = new ObjectMapper()
        .readTree(folder.resolve("weigh.json").toFile())
        .at("/weighings/0/functions/1/methods/0");
    // To the metre the sphere of equal range is a plane; over 9 km it is not.
    assertEquals(0.5, linear.get("shareAbove").asDouble(), 0);
  }

  @Test
  void anAbsentVariantIsTold() throws IOException {
    Path log = SyntheticLog.vessel(folder.resolve("harbour"));
    StudyRun run = StudyRun.of(
        "weigh",
        "--case",
        "vessel",
        "--log",
        log,
        "--untimed",
        "--method",
        "linear",
        "--out",
        folder);
    assertEquals(0, run.code(), run.err());
    assertTrue(run.out().contains("target 2 has no radar detection"), run.out());
  }
}

package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the page holds; how it looks is for {@code PageInBrowserTest}. */
class PageTest {
  /** What makes a browser load something: attributes, imports and calls, with any address. */
  private static final Pattern LOADS = Pattern.compile(
      "\\bsrc\\s*=|<link\\b|\\bhref\\s*=|@import|url\\(\\s*['\"]?https?:|\\bfetch\\(|XMLHttpRequest|\\bimport\\(|"
          + "WebSocket|sendBeacon|EventSource|importScripts");

  @TempDir
  private Path folder;

  @Test
  void theDemoHasASeriesForEachMethod() throws IOException {
    JsonNode data = page("replay").data();
    JsonNode flight = data.at("/variants/0");
    JsonNode results = StudyRun.results(folder).get("runs");
    assertEquals(6, flight.get("runs").size());
    assertEquals(90, flight.at("/truth/t").size());
    for (int i = 0; i < 6; i++) {
      JsonNode run = flight.get("runs").get(i);
      assertEquals(results.get(i).get("method"), run.get("name"));
      assertEquals(results.get(i).at("/scores/position/rmse"), run.at("/row/rmse"));
      assertEquals(90, run.get("t").size());
      assertEquals(6, run.get("mean").size());
      assertEquals(90, run.at("/sd/5").size());
      assertEquals(3, run.get("error").size());
      assertEquals(90, run.at("/nees/value").size());
      assertEquals(90, run.at("/updates/value").size());
      assertEquals(3, run.at("/updates/innovations").size());
      assertEquals(3, run.get("covariance").size());
    }
    assertEquals("azimuth", flight.at("/runs/0/updates/innovations/1/name").asText());
    assertEquals(87, count(flight.at("/runs/0/updates/verdict"), 3), "gated rows of linear");
    assertEquals(0, flight.at("/runs/0/updates/innovations/0/autocorrelation").size());
    assertEquals(22, flight.at("/runs/5/updates/innovations/0/autocorrelation").size());
  }

  /** Bends most at the start, where the balloon is known worst; its motion is affine. */
  @Test
  void cloudsShowWhereLinearisationIsWorst() throws IOException {
    JsonNode clouds = page("replay").data().at("/variants/0/clouds");
    assertEquals(4, clouds.size());
    JsonNode worst = clouds.get(0);
    assertEquals(0, worst.get("step").asInt());
    assertEquals(1200, worst.get("samples").size());
    assertEquals(6, worst.get("methods").size());
    double truth = worst.at("/restCovariance/0/0").asDouble();
    assertTrue(worst.at("/methods/0/restCovariance/0/0").asDouble() < 0.01 * truth, "linear");
    // Hermite points integrate what the curvature of the range has up to degree 5 exactly.
    assertEquals(1, worst.at("/methods/5/restCovariance/0/0").asDouble() / truth, 0.2);
    JsonNode motion = clouds.get(2);
    assertEquals("motion", motion.get("model").asText());
    assertTrue(motion.get("linearisationError").asDouble() < 1e-9);
  }

  @Test
  void nothingIsLoaded() throws IOException {
    Page page = page("replay", "--method", "linear");
    String html = page.html();
    assertTrue(html.contains("Content-Security-Policy\" content=\"default-src 'none'"));
    assertFalse(LOADS.matcher(withoutCharts(html)).find());
    assertTrue(html.length() < 2_000_000);
    assertFalse(html.contains("@script@") || html.contains("@charts@") || html.contains("@data@"));
  }

  /** The library is told apart by its own head; that it cannot load anything either, the policy sees to. */
  private static String withoutCharts(String html) {
    int begin = html.indexOf("Licensed to the Apache Software Foundation");
    int end = html.indexOf("</script>", begin);
    assertTrue(begin > 0 && end - begin > 500_000, "the chart library");
    return html.substring(0, begin) + html.substring(end);
  }

  @Test
  void withoutTruthAccuracyIsAbsent() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    Files.delete(log.resolve("groundtruth.csv"));
    JsonNode variant = uwb(log).data().at("/variants/0");
    assertFalse(variant.has("truth"));
    JsonNode run = variant.at("/runs/0");
    assertFalse(run.has("error"));
    assertFalse(run.has("nees"));
    for (String column : new String[] {"rmse", "max", "nees", "inside", "headingRmse"}) {
      assertFalse(run.get("row").has(column), column);
    }
    assertTrue(run.get("row").has("nis"));
  }

  @Test
  void truthThatNeverHoldsIsAbsentToo() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    SyntheticLog.write(log, "groundtruth.csv", "time_s,x_m,y_m", "900,0,0", "901,0,0");
    JsonNode variant = uwb(log).data().at("/variants/0");
    assertFalse(variant.at("/runs/0/row").has("rmse"));
    assertTrue(variant.at("/truth/values/0/0").isNull());
    assertTrue(variant.at("/runs/0/nees/value/0").isNull());
  }

  @Test
  void anAbsentVariantSaysWhy() throws IOException {
    Path log = SyntheticLog.vessel(folder.resolve("harbour"));
    JsonNode variants =
        page("replay", "--case", "vessel", "--log", log, "--method", "linear").data();
    JsonNode absent = variants.at("/variants/2");
    assertTrue(absent.get("absence").asText().contains("target 2"));
    assertFalse(absent.at("/runs/0").has("row"));
    assertEquals(0, absent.get("clouds").size());
  }

  @Test
  void namesOfLogsCannotBreakOut() throws IOException {
    Path parent = Files.createDirectories(folder.resolve("odd <"));
    Path log = SyntheticLog.uwb(parent.resolve("script><script>alert(1)<!-- é&\"'"));
    Page page = uwb(log);
    assertEquals(log.toString(), page.data().get("log").asText());
    assertTrue(page.data().at("/variants/0/label").asText().contains("<!--"));
    assertFalse(page.html().contains("<script>alert"));
    assertFalse(page.html().contains("<!--"));
    assertEquals(4, page.html().split("<script", -1).length, "three blocks of script and data");
  }

  @Test
  void stepsBelowToleranceAreCounted() throws IOException {
    StudyRun run = StudyRun.of("replay", "--method", "tolerance:1e-9", "--out", folder);
    assertEquals(0, run.code(), run.err());
    JsonNode result = StudyRun.results(folder).at("/runs/0");
    int below = result.get("stepsBelowTolerance").asInt();
    assertTrue(below > 0);
    String told =
        "tolerance:1e-9: " + below + " of " + result.get("steps") + " steps below tolerance";
    assertTrue(run.out().contains(told), run.out());
    assertEquals(
        below,
        Page.in(folder).data().at("/variants/0/runs/0/row/belowTolerance").asInt());
  }

  private static long count(JsonNode array, int wanted) {
    long count = 0;
    for (JsonNode each : array) {
      count += each.asInt() == wanted ? 1 : 0;
    }
    return count;
  }

  private Page uwb(Path log) throws IOException {
    return page("replay", "--case", "uwb", "--log", log, "--variant", "near", "--method", "linear");
  }

  private Page page(Object... words) throws IOException {
    Object[] all = Arrays.copyOf(words, words.length + 2);
    all[words.length] = "--out";
    all[words.length + 1] = folder;
    StudyRun run = StudyRun.of(all);
    assertEquals(0, run.code(), run.err());
    assertTrue(run.out().contains(folder.resolve("replay.html").toString()), run.out());
    return Page.in(folder);
  }
}

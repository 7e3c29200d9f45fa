package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Opens pages in a real browser, Chromium without a window: the one that the system property {@code browser} names, or {@code
 * chromium}. Screenshots are left in {@code target/browser} to be looked at.
 */
@Tag("browser")
class PageInBrowserTest {
  private static final Pattern PROBE =
      Pattern.compile("<output id=\"probe\"[^>]*>(.*?)</output>", Pattern.DOTALL);
  private static final String EXERCISE = """
      const seen = document.body.appendChild(document.createElement('p'));
      const choose = (select, i) => { select.selectedIndex = i; select.dispatchEvent(new Event('change')); };
      const all = () => document.querySelectorAll('select:not(#variant)').forEach(select => {
        for (let i = 0; i < select.options.length; i++) choose(select, i);
      });
      const boxes = () => [...document.querySelectorAll('input[type=checkbox]')];
      const clickAll = () => boxes().forEach((unused, i) => boxes()[i].click());
      const variant = document.getElementById('variant');
      for (let i = variant.options.length - 1; i >= 0; i--) {
        choose(variant, i);
        all();
        clickAll();
        all();
        clickAll();
        seen.textContent += document.getElementById('remarks').textContent;
      }
      const heads = () => document.querySelectorAll('th button');
      for (let i = 0; i < heads().length; i++) { heads()[i].click(); heads()[i].click(); }
      document.querySelectorAll('input[type=radio]').forEach(radio => radio.click());
      window.dispatchEvent(new Event('beforeprint'));
      window.dispatchEvent(new Event('afterprint'));
      """;
  private static final Path PICTURES = Path.of("target", "browser");

  @TempDir
  private Path folder;

  @Test
  void theDemoIsDrawnWhole() throws Exception {
    run("replay");
    JsonNode probe = probe();
    assertEquals(6, probe.get("rows").asInt());
    assertEquals(12, probe.get("columns").asInt());
    assertEquals("[1,1,1,1,1,1,2]", probe.at("/series/tradeoff").toString());
    assertEquals("[1200,73,73,73,73,73,73,73]", probe.at("/series/cloud").toString());
    assertEquals(13, probe.at("/series/track").size(), "six tracks, their ellipses, the truth");
    assertEquals(90, probe.at("/series/track/12").asInt());
    assertEquals(18, probe.at("/series/error").size(), "an error and two deviations a method");
    assertEquals("[90,90,90]", probe.at("/series/nees").toString(), "all above, and two bounds");
    assertEquals("[1,2,87,90,90]", probe.at("/series/nis").toString());
    picture("light", 1400, 3600);
    picture("dark", 1400, 3600, "--blink-settings=preferredColorScheme=0");
    picture("narrow", 500, 5200);
  }

  @Test
  void withoutTruthNothingOfAccuracyIsDrawn() throws Exception {
    Path log = SyntheticLog.uwb(folder.resolve("yard é&<b>"));
    Files.delete(log.resolve("groundtruth.csv"));
    run("replay", "--case", "uwb", "--log", log, "--smooth");
    JsonNode probe = probe();
    assertEquals(12, probe.get("rows").asInt());
    assertFalse(probe.get("series").has("tradeoff"));
    assertFalse(probe.get("series").has("nees"));
    assertEquals(24, probe.at("/series/track").size(), "twelve tracks and their ellipses");
    assertEquals(12, probe.at("/series/error").size(), "a deviation a method");
    assertTrue(dom().contains("This log has no truth"));
    picture("without-truth", 1400, 3000);
  }

  /** Every choice of every control is taken once, on a log of which two variants are absent. */
  @Test
  void allControlsCanBeUsed() throws Exception {
    Path log = SyntheticLog.vessel(folder.resolve("harbour"));
    run("replay", "--case", "vessel", "--log", log, "--smooth");
    Path page = folder.resolve("replay.html");
    Files.writeString(page, "<script>" + EXERCISE + "</script>", StandardOpenOption.APPEND);
    JsonNode probe = probe();
    String dom = dom();
    assertEquals(12, probe.get("rows").asInt());
    assertTrue(dom.contains("data-theme=\"dark\""), "the last theme chosen");
    assertTrue(dom.contains("aria-sort=\"descending\""), "sorted twice by the last column");
    assertTrue(dom.contains("target 2 has no radar detection"), "seen on the way");
  }

  private void run(Object... words) {
    List<Object> all = new ArrayList<>(List.of(words));
    all.addAll(List.of("--out", folder));
    StudyRun run = StudyRun.of(all.toArray());
    assertEquals(0, run.code(), run.err());
  }

  private JsonNode probe() throws Exception {
    Matcher found = PROBE.matcher(dom());
    assertTrue(found.find(), "the page's script ran");
    JsonNode probe = new ObjectMapper().readTree(found.group(1));
    assertEquals("[]", probe.get("faults").toString());
    return probe;
  }

  private String dom() throws Exception {
    return browse("--dump-dom");
  }

  private void picture(String name, int width, int height, String... more) throws Exception {
    Path picture = Files.createDirectories(PICTURES).resolve(name + ".png").toAbsolutePath();
    Files.deleteIfExists(picture);
    List<String> words = new ArrayList<>(List.of(more));
    words.add("--hide-scrollbars");
    words.add("--window-size=" + width + "," + height);
    words.add("--screenshot=" + picture);
    browse(words.toArray(new String[0]));
    assertTrue(Files.size(picture) > 20_000, "a picture that is not blank has many bytes");
  }

  /** Runs the browser on the page, and holds that its console stays silent. Returns its output. */
  private String browse(String... words) throws IOException, InterruptedException {
    Path out = Files.createTempFile(folder, "out", ".txt");
    Path err = Files.createTempFile(folder, "err", ".txt");
    List<String> command = new ArrayList<>(List.of(
        System.getProperty("browser", "chromium"),
        "--headless",
        "--no-sandbox",
        "--disable-gpu",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
        "--enable-logging=stderr",
        "--virtual-time-budget=8000",
        "--user-data-dir=" + Files.createTempDirectory(folder, "profile")));
    command.addAll(List.of(words));
    command.add(folder.resolve("replay.html").toUri().toString());
    Process browser = new ProcessBuilder(command)
        .redirectOutput(out.toFile())
        .redirectError(err.toFile())
        .start();
    if (!browser.waitFor(2, TimeUnit.MINUTES)) {
      browser.destroyForcibly().waitFor();
      throw new AssertionError("the browser did not end: " + Files.readString(err));
    }
    assertEquals(
        List.of(),
        Files.readAllLines(err).stream()
            .filter(line -> line.contains("CONSOLE"))
            .toList());
    return Files.readString(out);
  }
}

package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.tools.ToolProvider;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The case in README.md compiles, is found by its name, and runs. */
class ReadmeCaseTest {
  private static final Pattern CASE =
      Pattern.compile("```java study\n(.*?public class (\\w+).*?)```", Pattern.DOTALL);

  @TempDir
  private Path folder;

  @Test
  void theCaseInTheReadmeRuns() throws IOException {
    String name = compile();
    StudyRun weighed = run("weigh", "--case-class", name, "--untimed", "--every", "10");
    assertEquals(0, weighed.code(), weighed.err());
    JsonNode weighings = results("weigh.json").get("weighings");
    assertEquals("known", weighings.at("/0/variant").asText());
    assertTrue(weighings.at("/0/recommendation/suffices").asBoolean(), weighed.out());
    StudyRun replayed = run("replay", "--case-class", name, "--method", "hermite:3");
    assertEquals(0, replayed.code(), replayed.err());
    JsonNode results = results("results.json");
    assertEquals(name, results.get("case").asText());
    assertEquals("ok", results.at("/runs/0/status").asText());
    assertTrue(results.at("/runs/1/scores/position/rmse").isDouble());
  }

  private String compile() throws IOException {
    Matcher found = CASE.matcher(Files.readString(Path.of("..", "README.md")));
    assertTrue(found.find(), "README.md must hold a case");
    Path file = Files.writeString(folder.resolve(found.group(2) + ".java"), found.group(1));
    ByteArrayOutputStream messages = new ByteArrayOutputStream();
    int result = ToolProvider.getSystemJavaCompiler()
        .run(
            null,
            messages,
            messages,
            "-proc:none",
            "-d",
            folder.toString(),
            "-cp",
            System.getProperty("java.class.path"),
            file.toString());
    assertEquals(0, result, () -> messages.toString(StandardCharsets.UTF_8));
    return found.group(2);
  }

  private StudyRun run(Object... words) throws IOException {
    Object[] all = new Object[words.length + 2];
    System.arraycopy(words, 0, all, 0, words.length);
    all[words.length] = "--out";
    all[words.length + 1] = folder;
    ClassLoader before = Thread.currentThread().getContextClassLoader();
    try (URLClassLoader own = new URLClassLoader(new URL[] {folder.toUri().toURL()}, before)) {
      Thread.currentThread().setContextClassLoader(own);
      return StudyRun.of(all);
    } finally {
      Thread.currentThread().setContextClassLoader(before);
    }
  }

  private JsonNode results(String name) throws IOException {
    return new ObjectMapper().readTree(folder.resolve(name).toFile());
  }
}

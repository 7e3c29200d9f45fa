package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The accuracy of the demonstration is what it was when the files in {@code baseline} were made, but for one part in a
 * thousand: far above what another JDK's sines change, far below what a method that was spoilt would. Each run leaves fresh
 * files, without times and estimates, in {@code target/baseline}; they replace the old ones where a change was meant.
 */
class BaselineTest {
  private static final Path FRESH = Path.of("target", "baseline");

  @TempDir
  private Path folder;

  @Test
  void replayIsAsAccurateAsItWas() throws IOException {
    assertNoLoss("results.json", "replay", "--smooth");
  }

  @Test
  void methodsAreAsAccurateAsTheyWere() throws IOException {
    assertNoLoss("weigh.json", "weigh", "--untimed", "--every", "3");
  }

  private void assertNoLoss(String file, Object... words) throws IOException {
    Object[] all = new Object[words.length + 2];
    System.arraycopy(words, 0, all, 0, words.length);
    all[words.length] = "--out";
    all[words.length + 1] = folder;
    assertEquals(0, StudyRun.of(all).code());
    Path fresh = keep(file);
    Path old = Path.of("src", "test", "resources", "baseline", file);
    StudyRun compared = StudyRun.of("compare", old, fresh, "--allow=0.001");
    assertEquals(0, compared.code(), compared.out() + compared.err());
  }

  private Path keep(String file) throws IOException {
    ObjectMapper mapper = new ObjectMapper();
    JsonNode root = mapper.readTree(folder.resolve(file).toFile());
    root.path("runs")
        .forEach(run -> ((ObjectNode) run).remove(List.of("nanosPerStep", "final", "checkpoints")));
    Files.createDirectories(FRESH);
    return Files.writeString(
        FRESH.resolve(file),
        mapper.writerWithDefaultPrettyPrinter().writeValueAsString(root) + "\n");
  }
}

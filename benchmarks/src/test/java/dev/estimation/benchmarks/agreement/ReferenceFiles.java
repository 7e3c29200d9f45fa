package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import dev.estimation.benchmarks.log.LogFolder;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;

/**
 * Logs and the results that an independent program computed for them. They are not part of the
 * sources: where they are missing, tests that want them are skipped.
 */
final class ReferenceFiles {
  private static final Path FOLDER = Path.of(System.getProperty("reference.dir", "../../shared"));

  private ReferenceFiles() {}

  /** {@return whether the files are there} */
  static boolean exist() {
    return Files.isDirectory(FOLDER.resolve("cases")) && Files.isDirectory(FOLDER.resolve("data"));
  }

  /** {@return in place of the tests that want the files: one that is skipped and says why} */
  static List<DynamicTest> skipped() {
    return List.of(DynamicTest.dynamicTest(
        "skipped: no reference",
        () -> assumeTrue(false, "no cases and data in " + FOLDER + "; set reference.dir")));
  }

  /** {@return the runs that the expected file of a case holds} */
  static JsonNode expectedRuns(String caseName) {
    return parse(FOLDER.resolve("cases").resolve(caseName + "-expected.json")).get("runs");
  }

  /** {@return the rows of a file of checkpoints, cells split, header left out} */
  static Stream<String[]> checkpoints(String fileName) {
    return read(FOLDER.resolve("cases").resolve(fileName))
        .lines()
        .skip(1)
        .map(line -> line.split(","));
  }

  static LogFolder log(String name) {
    return LogFolder.open(FOLDER.resolve("data").resolve(name).toString());
  }

  private static JsonNode parse(Path file) {
    try {
      return new ObjectMapper().readTree(file.toFile());
    } catch (IOException broken) {
      throw new UncheckedIOException(broken);
    }
  }

  private static String read(Path file) {
    try {
      return Files.readString(file);
    } catch (IOException broken) {
      throw new UncheckedIOException(broken);
    }
  }

  /** {@return the run with a label} */
  static JsonNode run(JsonNode runs, String label) {
    for (JsonNode run : runs) {
      if (run.get("label").asText().equals(label)) {
        return run;
      }
    }
    throw new AssertionError("no run " + label + " among the expected ones");
  }

  static double[] numbers(JsonNode array) {
    double[] numbers = new double[array.size()];
    Arrays.setAll(numbers, i -> array.get(i).asDouble());
    return numbers;
  }
}

package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import dev.estimation.benchmarks.log.BadInputException;
import java.io.IOException;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;

/** Reads what {@code replay}, {@code sweep} or {@code weigh} wrote. */
final class ResultsFile {
  private ResultsFile() {}

  static JsonNode read(String typed) {
    JsonNode root = parse(typed);
    boolean runs = root.path("runs").isArray();
    boolean weighings =
        root.path("weighings").isArray() && root.path("tolerance").isNumber();
    if (!root.path("case").isTextual() || runs == weighings) {
      throw new BadInputException("not a file of results: " + typed);
    }
    if (root.path(runs ? "runs" : "weighings").isEmpty()) {
      throw new BadInputException("no results in " + typed);
    }
    return root;
  }

  private static JsonNode parse(String typed) {
    try {
      return new ObjectMapper().readTree(Path.of(typed).toFile());
    } catch (JsonProcessingException broken) {
      throw new BadInputException(
          "no JSON in " + typed + ": " + broken.getOriginalMessage(), broken);
    } catch (IOException | InvalidPathException missing) {
      throw new BadInputException("results cannot be read: " + typed, missing);
    }
  }
}

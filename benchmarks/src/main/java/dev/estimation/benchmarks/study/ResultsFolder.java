package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.ObjectWriter;
import dev.estimation.benchmarks.log.BadInputException;
import java.io.IOException;
import java.io.Writer;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/** The folder for results. A file appears in it whole or not at all. */
final class ResultsFolder {
  private final Path folder;

  /** What a file shall hold. */
  interface Content {
    void writeTo(Writer out) throws IOException;
  }

  private ResultsFolder(Path folder) {
    this.folder = folder;
  }

  /**
   * Makes the folder where it does not exist yet; tells early that nothing can be written there.
   */
  static ResultsFolder prepare(String typed) {
    if (typed.isBlank()) {
      throw new BadInputException("results folder must have a name, got ''");
    }
    try {
      Path folder = Files.createDirectories(Path.of(typed));
      if (!Files.isWritable(folder)) {
        throw new BadInputException("results folder is not writable: " + typed);
      }
      return new ResultsFolder(folder);
    } catch (FileAlreadyExistsException file) {
      throw new BadInputException("results folder is a file: " + typed, file);
    } catch (IOException | InvalidPathException refused) {
      throw new BadInputException(
          "results folder cannot be made: " + typed + " (" + reason(refused) + ")", refused);
    }
  }

  /** Writes a document; see the other method. */
  Path write(String name, JsonNode document) {
    ObjectWriter pretty = new ObjectMapper().writerWithDefaultPrettyPrinter();
    return write(name, out -> out.write(pretty.writeValueAsString(document) + "\n"));
  }

  /** Writes aside, then moves into place over any earlier file. Returns the file. */
  Path write(String name, Content content) {
    Path file = folder.resolve(name);
    Path aside = folder.resolve(name + "." + ProcessHandle.current().pid() + ".part");
    try {
      try (Writer out = Files.newBufferedWriter(aside)) {
        content.writeTo(out);
      }
      return Files.move(
          aside, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (IOException refused) {
      discard(aside, refused);
      throw new BadInputException(
          "results cannot be written: " + file + " (" + reason(refused) + ")", refused);
    }
  }

  private static void discard(Path aside, IOException reason) {
    try {
      Files.deleteIfExists(aside);
    } catch (IOException second) {
      reason.addSuppressed(second);
    }
  }

  private static String reason(Exception refused) {
    return refused.getClass().getSimpleName() + ": " + refused.getMessage();
  }
}

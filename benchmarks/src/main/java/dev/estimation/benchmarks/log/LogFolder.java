package dev.estimation.benchmarks.log;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;

/** A folder that holds one recorded log. <i>Immutable.</i> */
public final class LogFolder {
  private final String typed;
  private final Path folder;
  private final String name;

  private LogFolder(String typed, Path folder, String name) {
    this.typed = typed;
    this.folder = folder;
    this.name = name;
  }

  /**
   * Opens a folder.
   *
   * @param typed the path as it was given
   * @throws BadInputException if there is no such folder
   */
  public static LogFolder open(String typed) {
    if (typed.isBlank()) {
      throw new BadInputException("log folder must have a name, got ''");
    }
    try {
      Path folder = Path.of(typed);
      Path last = folder.toRealPath().getFileName();
      if (!Files.isDirectory(folder)) {
        throw new BadInputException("log must be a folder, got the file " + typed);
      }
      return new LogFolder(typed, folder, last == null ? "root" : last.toString());
    } catch (IOException | InvalidPathException missing) {
      throw new BadInputException("log folder not found: " + typed, missing);
    }
  }

  /** {@return the path as it was given} */
  public String typed() {
    return typed;
  }

  /** {@return the last name of the folder's real path} */
  public String name() {
    return name;
  }

  /** {@return a file of this folder, which need not exist} */
  public Path file(String fileName) {
    return folder.resolve(fileName);
  }
}

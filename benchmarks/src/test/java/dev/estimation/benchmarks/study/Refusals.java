package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;

/** Runs that must be refused: in one line, with exit code 2 and nothing written. */
final class Refusals {
  private final Path out;

  /**
   * Refusals of runs that would write to a folder.
   *
   * @param out need not exist
   */
  Refusals(Path out) {
    this.out = out;
  }

  /** {@return the words that replay a log} */
  Object[] replay(String caseName, Object log, String... more) {
    Object[] all = {"replay", "--case", caseName, "--log", log, "--out", out};
    Object[] whole = Arrays.copyOf(all, all.length + more.length);
    System.arraycopy(more, 0, whole, all.length, more.length);
    return whole;
  }

  /** Runs, and holds the one line against the parts that it must have. */
  void assertRefused(Object[] arguments, String... parts) {
    StudyRun run = StudyRun.of(arguments);
    assertEquals(2, run.code(), run.err());
    assertEquals(1, run.err().lines().count(), run.err());
    assertTrue(run.err().startsWith("study: "), run.err());
    for (String part : parts) {
      assertTrue(run.err().contains(part), () -> "wanted '" + part + "' in " + run.err());
    }
    assertFalse(Files.isRegularFile(out.resolve("results.json")), "nothing may be written");
  }
}

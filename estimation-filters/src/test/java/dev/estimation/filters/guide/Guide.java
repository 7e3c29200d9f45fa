package dev.estimation.filters.guide;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** MODELS.md, parts of which are generated. */
public final class Guide {
  private Guide() {}

  /**
   * Writes a generated part into the target folder and fails unless MODELS.md holds it, letter for letter.
   *
   * @param file name in the target folder
   * @param text lines
   */
  public static void assertHolds(String file, String text) throws IOException {
    Path written = Files.writeString(Path.of("target", file), text);
    String guide = Files.readString(Path.of("MODELS.md")).replace("\r\n", "\n");
    assertTrue(
        guide.contains(text),
        () -> "MODELS.md must hold the text of " + written.toAbsolutePath() + ", got another");
  }
}

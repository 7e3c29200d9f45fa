package dev.estimation.benchmarks.log;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class LogFolderTest {
  @TempDir
  private Path folder;

  @Test
  void isNamedAfterItsRealPath() throws IOException {
    Path real = Files.createDirectory(folder.resolve("harbour-7"));
    Path link = Files.createSymbolicLink(folder.resolve("latest"), real);
    assertEquals("harbour-7", LogFolder.open(real + "/").name());
    assertEquals("harbour-7", LogFolder.open(real + "/.").name());
    assertEquals("harbour-7", LogFolder.open(link.toString()).name());
    assertEquals("harbour-7", LogFolder.open(real + "/../latest/").name());
  }

  @Test
  void keepsThePathAsTyped() throws IOException {
    Path real = Files.createDirectory(folder.resolve("a"));
    assertEquals(real + "/./", LogFolder.open(real + "/./").typed());
    assertTrue(Files.isSameFile(real, LogFolder.open(real + "/./").file(".")));
  }

  @Test
  void refusesWhatIsNoFolder() throws IOException {
    Path file = Files.createFile(folder.resolve("file.csv"));
    assertTrue(failure(file).contains("file.csv"));
    assertTrue(failure(folder.resolve("nowhere")).contains("nowhere"));
  }

  private static String failure(Path path) {
    return assertThrows(BadInputException.class, () -> LogFolder.open(path.toString()))
        .getMessage();
  }
}

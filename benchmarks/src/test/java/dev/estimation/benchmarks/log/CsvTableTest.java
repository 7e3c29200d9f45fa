package dev.estimation.benchmarks.log;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class CsvTableTest {
  @TempDir
  private Path folder;

  @Test
  void findsColumnsByNameInAnyOrder() throws IOException {
    CsvTable table = table("extra,b,a\nx,2,1\ny,4,3\n");
    assertEquals(2, table.rows().size());
    assertEquals(3, table.rows().get(1).number("a"));
    assertEquals("2", table.rows().get(0).text("b"));
    assertTrue(table.hasColumn("extra"));
    assertFalse(table.hasColumn("c"));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "\uFEFFa,b\n1,2\n",
        "\uFEFF\"a\",b\n1,2\n",
        "a,b\r\n1,2\r\n\r\n",
        "a,b\n1,2",
        "\na , b\n\n 1 , 2 \n   \n\n"
      })
  void takesEveryKindOfTextFile(String content) throws IOException {
    CsvTable table = table(content);
    assertEquals(1, table.rows().size());
    assertEquals(1, table.rows().get(0).number("a"));
    assertEquals(2, table.rows().get(0).number("b"));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"NaN", "Infinity", "-Infinity", "1e999", "0x1p3", "1f", "x", "1,2", "--1"})
  void tellsFileLineAndColumnOfWhatIsNotANumber(String cell) throws IOException {
    CsvRow row = table("a,b\r\n1,2\r\n\r\n3,\"" + cell + "\"\r\n").rows().get(1);
    String message =
        assertThrows(BadInputException.class, () -> row.number("b")).getMessage();
    assertContains(message, "log.csv", "line 4", "column b", cell, "finite number");
  }

  @Test
  void countsTheLastLineWithoutLineEnd() throws IOException {
    CsvRow row = table("a,b\n1,2\n3,x").rows().get(1);
    String message =
        assertThrows(BadInputException.class, () -> row.number("b")).getMessage();
    assertContains(message, "line 3", "column b");
  }

  @Test
  void tellsAnEmptyCellFromAMissingOne() throws IOException {
    CsvRow row = table("a,b\n1,\n").rows().get(0);
    assertTrue(row.optionalNumber("b").isEmpty());
    assertEquals(1, row.optionalNumber("a").orElseThrow());
    String message =
        assertThrows(BadInputException.class, () -> row.number("b")).getMessage();
    assertContains(message, "line 2", "column b", "empty");
  }

  @ParameterizedTest
  @CsvSource({"3,3", "3.0,3", "-7,-7", "1e3,1000"})
  void readsWholeNumbers(String cell, long expected) throws IOException {
    assertEquals(expected, table("a,b\n" + cell + ",0\n").rows().get(0).integer("a"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"3.5", "1e30", "NaN"})
  void refusesWhatIsNotWhole(String cell) throws IOException {
    CsvRow row = table("a,b\n" + cell + ",0\n").rows().get(0);
    String message =
        assertThrows(BadInputException.class, () -> row.integer("a")).getMessage();
    assertContains(message, "line 2", "column a", cell);
  }

  @Test
  void refusesRowsOfAnotherLength() throws IOException {
    assertContains(failure("a,b\n1,2\n3\n"), "line 3", "2 cells", "got 1");
    assertContains(failure("a,b\n1,2,3\n"), "line 2", "2 cells", "got 3");
  }

  @Test
  void refusesWrongHeaders() throws IOException {
    assertContains(failure("a,c\n1,2\n"), "line 1", "column b", "a,c");
    assertContains(failure("a,b,b\n1,2,3\n"), "line 1", "column b", "2");
    assertContains(failure(""), "empty", "a, b");
    assertContains(failure("\n \n"), "empty");
  }

  @Test
  void refusesWhatIsNoTextFile() throws IOException {
    Path missing = folder.resolve("missing.csv");
    assertContains(failure(missing), "missing.csv", "not found");
    assertContains(failure(folder), "cannot be read");
    Path binary = folder.resolve("binary.csv");
    Files.write(binary, new byte[] {'a', (byte) 0xC3, (byte) 0x28, '\n'});
    assertContains(failure(binary), "binary.csv", "UTF-8");
    assertContains(failure("a,b\n1,\"2\n"), "log.csv");
  }

  @Test
  void aFileThatMayBeMissingHasNoRowsThen() throws IOException {
    Path file = folder.resolve("maybe.csv");
    assertTrue(CsvTable.readIfPresent(file, "a").rows().isEmpty());
    Files.writeString(file, "");
    assertTrue(CsvTable.readIfPresent(file, "a").rows().isEmpty());
    Files.writeString(file, "a\n");
    assertTrue(CsvTable.readIfPresent(file, "a").rows().isEmpty());
    Files.writeString(file, "b\n");
    assertThrows(BadInputException.class, () -> CsvTable.readIfPresent(file, "a"));
  }

  @Test
  void tellsAFileWithoutRows() throws IOException {
    CsvTable table = table("a,b\n");
    String message = assertThrows(BadInputException.class, table::requireRows).getMessage();
    assertContains(message, "log.csv", "no rows");
  }

  private CsvTable table(String content) throws IOException {
    return CsvTable.read(write(content), "a", "b");
  }

  private String failure(String content) throws IOException {
    return failure(write(content));
  }

  private static String failure(Path file) {
    return assertThrows(BadInputException.class, () -> CsvTable.read(file, "a", "b"))
        .getMessage();
  }

  private Path write(String content) throws IOException {
    return Files.write(folder.resolve("log.csv"), content.getBytes(StandardCharsets.UTF_8));
  }

  private static void assertContains(String message, String... parts) {
    for (String part : parts) {
      assertTrue(message.contains(part), () -> "wanted '" + part + "' in: " + message);
    }
    assertFalse(message.contains("\n"), () -> "one line wanted: " + message);
  }
}

package dev.estimation.benchmarks.log;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.CharacterCodingException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;

/**
 * A comma-separated file with a header line. Columns are found by name, so their order is free and
 * further columns do no harm. A byte order mark, either kind of line end and blank lines are taken.
 * <i>Immutable.</i>
 */
public final class CsvTable {
  private static final CSVFormat FORMAT =
      CSVFormat.DEFAULT.builder().setIgnoreEmptyLines(true).setTrim(true).get();
  private static final int BYTE_ORDER_MARK = 0xFEFF;

  private final Path file;
  private final List<String> header;
  private final List<CsvRow> rows;

  private CsvTable(Path file, List<String> header) {
    this.file = file;
    this.header = header;
    this.rows = new ArrayList<>();
  }

  /**
   * Reads a file.
   *
   * @param columns that the header must have
   * @throws BadInputException if the file cannot be read or has no such header
   */
  public static CsvTable read(Path file, String... columns) {
    CsvTable table = parse(file);
    if (table.header.isEmpty()) {
      throw new BadInputException(
          file + ": file is empty; wanted a header with " + String.join(", ", columns));
    }
    table.requireColumns(columns);
    return table;
  }

  /** Reads a file that may be missing or empty, which gives a table without rows. */
  public static CsvTable readIfPresent(Path file, String... columns) {
    if (Files.notExists(file)) {
      return new CsvTable(file, Arrays.asList(columns));
    }
    CsvTable table = parse(file);
    if (!table.header.isEmpty()) {
      table.requireColumns(columns);
    }
    return table;
  }

  private static CsvTable parse(Path file) {
    try (BufferedReader reader = Files.newBufferedReader(file)) {
      skipByteOrderMark(reader);
      try (CSVParser parser =
          CSVParser.builder().setReader(reader).setFormat(FORMAT).get()) {
        return parse(file, parser);
      }
    } catch (NoSuchFileException missing) {
      throw new BadInputException(file + ": file not found", missing);
    } catch (CharacterCodingException garbled) {
      throw new BadInputException(file + ": file is not UTF-8 text", garbled);
    } catch (IOException | UncheckedIOException broken) {
      throw new BadInputException(file + ": file cannot be read: " + broken.getMessage(), broken);
    }
  }

  private static void skipByteOrderMark(BufferedReader reader) throws IOException {
    reader.mark(1);
    if (reader.read() != BYTE_ORDER_MARK) {
      reader.reset();
    }
  }

  private static CsvTable parse(Path file, CSVParser parser) {
    CsvTable table = null;
    for (CSVRecord record : parser) {
      if (isBlank(record)) {
        continue;
      }
      if (table == null) {
        table = new CsvTable(file, record.toList());
      } else {
        table.add(parser.getCurrentLineNumber(), record.toList());
      }
    }
    return table == null ? new CsvTable(file, List.of()) : table;
  }

  private static boolean isBlank(CSVRecord record) {
    return record.size() == 1 && record.get(0).isBlank();
  }

  private void add(long line, List<String> cells) {
    if (cells.size() != header.size()) {
      throw new BadInputException(file + ", line " + line + ": row must have " + header.size()
          + " cells as the header has, got " + cells.size());
    }
    rows.add(new CsvRow(this, line, cells));
  }

  private void requireColumns(String... columns) {
    for (String column : columns) {
      int times = Collections.frequency(header, column);
      if (times != 1) {
        throw new BadInputException(
            file + ", line 1: header must have the column " + column + " once, got "
                + (times == 0 ? "none" : times) + " (header: " + String.join(",", header) + ")");
      }
    }
  }

  /** Fails if there is no row below the header. */
  public CsvTable requireRows() {
    if (rows.isEmpty()) {
      throw new BadInputException(file + ": file has no rows below its header");
    }
    return this;
  }

  /** {@return whether the header has this column} */
  public boolean hasColumn(String column) {
    return header.contains(column);
  }

  /** {@return the rows, in file order} */
  public List<CsvRow> rows() {
    return Collections.unmodifiableList(rows);
  }

  Path file() {
    return file;
  }

  int index(String column) {
    int index = header.indexOf(column);
    if (index < 0) {
      throw new IllegalArgumentException("column " + column + " was not asked for in " + file);
    }
    return index;
  }
}

package dev.estimation.testing;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * A table of outside values: a CSV resource under {@code /reference} whose first lines, each
 * beginning with {@code #}, say where the values come from, how they were obtained and when. Fields
 * hold no commas; a field may hold several numbers parted by blanks.
 */
public final class ReferenceTable {
  private final List<String> provenance;
  private final List<Row> rows;

  private ReferenceTable(List<String> provenance, List<Row> rows) {
    this.provenance = provenance;
    this.rows = rows;
  }

  /**
   * Reads a table.
   *
   * @param name e.g. {@code gauss_hermite.csv}
   * @throws IllegalStateException if there is no such resource, no provenance, or no row
   */
  public static ReferenceTable read(String name) {
    List<String> lines = lines(name);
    List<String> head = lines.stream().takeWhile(line -> line.startsWith("#")).toList();
    for (String wanted : List.of("# Source:", "# How obtained:", "# Date:")) {
      if (head.stream().noneMatch(line -> line.startsWith(wanted))) {
        throw new IllegalStateException(name + " must have a line starting with " + wanted);
      }
    }
    if (lines.size() < head.size() + 2) {
      throw new IllegalStateException(name + " must have column names and at least 1 row");
    }
    String[] columns = lines.get(head.size()).split(",");
    return new ReferenceTable(
        head,
        lines.stream()
            .skip(head.size() + 1L)
            .map(line -> Row.of(name, columns, line))
            .toList());
  }

  private static List<String> lines(String name) {
    try (InputStream stream = ReferenceTable.class.getResourceAsStream("/reference/" + name)) {
      if (stream == null) {
        throw new IllegalStateException("no resource /reference/" + name);
      }
      return new BufferedReader(new InputStreamReader(stream, StandardCharsets.UTF_8))
          .lines()
          .filter(line -> !line.isBlank())
          .collect(Collectors.toList());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** The lines that say where the values come from. */
  public List<String> provenance() {
    return provenance;
  }

  /** All rows, in order. */
  public List<Row> rows() {
    return rows;
  }

  /** The rows with the given text in a column; fails if there is none. */
  public List<Row> rowsWhere(String column, String value) {
    List<Row> found =
        rows.stream().filter(row -> row.text(column).equals(value)).toList();
    if (found.isEmpty()) {
      throw new IllegalStateException("no row with " + column + " = " + value);
    }
    return found;
  }

  /** The only row with the given text in a column. */
  public Row rowWhere(String column, String value) {
    List<Row> found = rowsWhere(column, value);
    if (found.size() != 1) {
      throw new IllegalStateException(found.size() + " rows with " + column + " = " + value);
    }
    return found.get(0);
  }

  /** The rows, for parameterised tests. */
  public Stream<Row> stream() {
    return rows.stream();
  }

  /** One row. */
  public static final class Row {
    private final Map<String, String> fields;

    private Row(Map<String, String> fields) {
      this.fields = fields;
    }

    private static Row of(String table, String[] columns, String line) {
      String[] values = line.split(",", -1);
      if (values.length != columns.length) {
        throw new IllegalStateException(
            table + " must have " + columns.length + " fields in each row, got: " + line);
      }
      Map<String, String> fields = new HashMap<>();
      for (int i = 0; i < columns.length; i++) {
        fields.put(columns[i], values[i]);
      }
      return new Row(fields);
    }

    /** A field as it stands. */
    public String text(String column) {
      String value = fields.get(column);
      if (value == null) {
        throw new IllegalStateException("no column " + column + ", only " + fields.keySet());
      }
      return value;
    }

    /** A field as a number. */
    public double number(String column) {
      return Double.parseDouble(text(column));
    }

    /** A field as a whole number. */
    public int count(String column) {
      return Integer.parseInt(text(column));
    }

    /** A field of numbers parted by blanks. */
    public double[] numbers(String column) {
      return Arrays.stream(text(column).split(" "))
          .mapToDouble(Double::parseDouble)
          .toArray();
    }

    @Override
    public String toString() {
      return fields.toString();
    }
  }
}

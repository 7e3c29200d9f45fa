package dev.estimation.benchmarks.study;

import java.io.IOException;
import java.io.Reader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;

/**
 * A file of steps, read back.
 *
 * @param columns names, in order
 * @param rows lines below the head
 */
record StepsTable(List<String> columns, List<CSVRecord> rows) {
  static StepsTable read(Path file) throws IOException {
    try (Reader in = Files.newBufferedReader(file)) {
      return read(in);
    }
  }

  static StepsTable read(Reader in) throws IOException {
    CSVFormat format =
        CSVFormat.RFC4180.builder().setHeader().setSkipHeaderRecord(true).get();
    try (var parser = format.parse(in)) {
      return new StepsTable(parser.getHeaderNames(), parser.getRecords());
    }
  }

  String text(int row, String column) {
    return rows.get(row).get(column);
  }

  double number(int row, String column) {
    return Double.parseDouble(text(row, column));
  }

  /** {@return the values of a column, line by line} */
  List<String> column(String column) {
    return rows.stream().map(row -> row.get(column)).toList();
  }
}

package dev.estimation.benchmarks.log;

import java.math.BigDecimal;
import java.util.List;
import java.util.OptionalDouble;

/** One row of a {@link CsvTable}; cells are asked for by column name. <i>Immutable.</i> */
public final class CsvRow {
  private final CsvTable table;
  private final long line;
  private final List<String> cells;

  CsvRow(CsvTable table, long line, List<String> cells) {
    this.table = table;
    this.line = line;
    this.cells = cells;
  }

  /** {@return the cell, without surrounding blanks; never empty} */
  public String text(String column) {
    String cell = cell(column);
    if (cell.isEmpty()) {
      throw error(column, "must not be empty");
    }
    return cell;
  }

  /** {@return the cell as a finite number} */
  public double number(String column) {
    String cell = text(column);
    return DecimalNumber.parse(cell)
        .orElseThrow(() -> error(column, "must be a finite number, got '" + cell + "'"));
  }

  /** {@return the cell as a finite number, or nothing if it is empty} */
  public OptionalDouble optionalNumber(String column) {
    return cell(column).isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(number(column));
  }

  /** {@return the cell as a whole number; 3.0 is one} */
  public long integer(String column) {
    double value = number(column);
    try {
      return BigDecimal.valueOf(value).longValueExact();
    } catch (ArithmeticException notWhole) {
      throw error(column, "must be a whole number, got '" + cell(column) + "'");
    }
  }

  /** {@return an error that says where in which file this row stands} */
  public BadInputException error(String column, String problem) {
    return new BadInputException(
        table.file() + ", line " + line + ", column " + column + ": " + problem);
  }

  private String cell(String column) {
    return cells.get(table.index(column));
  }
}

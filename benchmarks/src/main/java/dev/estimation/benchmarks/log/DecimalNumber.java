package dev.estimation.benchmarks.log;

import java.util.OptionalDouble;
import java.util.regex.Pattern;

/** Decimal numbers as people and programs write them: no hexadecimal, no suffix, no NaN. */
public final class DecimalNumber {
  private static final Pattern FORM =
      Pattern.compile("[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d+)?");

  private DecimalNumber() {}

  /** {@return the number, or nothing if the text is not a finite decimal number} */
  public static OptionalDouble parse(String text) {
    if (!FORM.matcher(text).matches()) {
      return OptionalDouble.empty();
    }
    double value = Double.parseDouble(text);
    return Double.isFinite(value) ? OptionalDouble.of(value) : OptionalDouble.empty();
  }
}

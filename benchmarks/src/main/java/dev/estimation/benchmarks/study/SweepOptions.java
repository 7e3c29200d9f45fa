package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.DecimalNumber;
import dev.estimation.benchmarks.weigh.Workers;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import picocli.CommandLine.Option;

/** What is run over lists of values, and by how many threads. */
final class SweepOptions {
  @Option(
      names = "--noise-scale",
      paramLabel = "F,...",
      description = "factors on the standard deviations of all measurement noise (default 1)")
  private String noiseScales = "1";

  @Option(
      names = "--rows",
      paramLabel = "N",
      description = "use the first N measurement rows of each step, not all")
  private Integer rows;

  @Option(
      names = "--threads",
      paramLabel = "N",
      description = "results do not depend on it (default: one a core)")
  private Integer threads;

  List<Double> noiseScales() {
    List<Double> scales = numbers("--noise-scale", noiseScales);
    if (scales.stream().anyMatch(scale -> !(scale > 0))) {
      throw new BadInputException("--noise-scale must be above 0, got " + noiseScales);
    }
    return scales;
  }

  int rows() {
    return rows == null ? Integer.MAX_VALUE : atLeastOne("--rows", rows);
  }

  Workers workers() {
    return threads == null ? Workers.onAllCores() : new Workers(atLeastOne("--threads", threads));
  }

  /** {@return the distinct numbers of a list with commas} */
  static List<Double> numbers(String option, String list) {
    return Stream.of(list.split(",", -1))
        .map(text -> DecimalNumber.parse(text)
            .orElseThrow(() -> new BadInputException(
                option + " must be finite numbers with commas between them, got '" + list + "'")))
        .collect(LinkedHashSet<Double>::new, LinkedHashSet::add, LinkedHashSet::addAll)
        .stream()
        .toList();
  }

  /** {@return a number above 0} */
  static double positive(String option, String text) {
    OptionalDouble number = DecimalNumber.parse(text);
    if (number.isEmpty() || !(number.getAsDouble() > 0)) {
      throw new BadInputException(option + " must be a number above 0, got '" + text + "'");
    }
    return number.getAsDouble();
  }

  static int atLeastOne(String option, int number) {
    if (number < 1) {
      throw new BadInputException(option + " must be 1 or more, got " + number);
    }
    return number;
  }
}

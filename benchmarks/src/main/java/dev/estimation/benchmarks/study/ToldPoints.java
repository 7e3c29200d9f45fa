package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.CsvRow;
import dev.estimation.benchmarks.log.CsvTable;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.weigh.Region;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** A file of estimates: the step, the mean, and the standard deviations of independent components. */
final class ToldPoints {
  private static final String STEP = "step";
  private static final String MEAN = "mean_";
  private static final String DEVIATION = "deviation_";

  private ToldPoints() {}

  static List<Region.Told> read(String typed, Scenario scenario) {
    Space space = scenario.motion().stateSpace();
    String[] columns = Stream.of(
            Stream.of(STEP),
            IntStream.range(0, space.storage()).mapToObj(i -> MEAN + i),
            IntStream.range(0, space.dimension()).mapToObj(i -> DEVIATION + i))
        .flatMap(names -> names)
        .toArray(String[]::new);
    List<Region.Told> points = new ArrayList<>();
    for (CsvRow row : CsvTable.read(path(typed), columns).requireRows().rows()) {
      points.add(point(row, scenario, space));
    }
    return points;
  }

  private static Path path(String typed) {
    try {
      return Path.of(typed);
    } catch (InvalidPathException refused) {
      throw new BadInputException("--points must be a file, got '" + typed + "'", refused);
    }
  }

  private static Region.Told point(CsvRow row, Scenario scenario, Space space) {
    long step = row.integer(STEP);
    if (step < 0 || step >= scenario.steps().size()) {
      throw row.error(STEP, "must be from 0 to " + (scenario.steps().size() - 1) + ", got " + step);
    }
    double[] mean = numbers(row, MEAN, space.storage());
    double[] deviations = numbers(row, DEVIATION, space.dimension());
    try {
      return new Region.Told((int) step, Gaussian.independent(space, mean, deviations));
    } catch (IllegalArgumentException refused) {
      throw row.error(STEP, "has no estimate: " + refused.getMessage());
    }
  }

  private static double[] numbers(CsvRow row, String name, int count) {
    return IntStream.range(0, count).mapToDouble(i -> row.number(name + i)).toArray();
  }
}

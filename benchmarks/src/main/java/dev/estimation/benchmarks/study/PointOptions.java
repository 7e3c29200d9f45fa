package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.weigh.Region;
import dev.estimation.benchmarks.weigh.Selection;
import picocli.CommandLine.Option;

/** Where methods are weighed. */
final class PointOptions {
  @Option(names = "--from", paramLabel = "STEP", description = "first step, counted from 0")
  private Integer from;

  @Option(names = "--to", paramLabel = "STEP", description = "last step")
  private Integer to;

  @Option(
      names = "--every",
      paramLabel = "N",
      description = "every Nth point of each function (default: at most 400 points)")
  private Integer every;

  @Option(
      names = "--points",
      paramLabel = "FILE",
      description =
          "estimates to weigh at in place of those of a run: step, mean_0, ..., deviation_0, ...")
  private String file;

  /** Refuses what is wrong whatever the log is. */
  void check() {
    selection();
    if (file != null && (from != null || to != null || every != null)) {
      throw new BadInputException("--points tells all points: no --from, --to or --every with it");
    }
  }

  private Selection selection() {
    int first = from == null ? 0 : from;
    int last = to == null ? Integer.MAX_VALUE : to;
    if (first < 0 || last < first) {
      throw new BadInputException("--from must be 0 or more and --to not before it, got --from "
          + first + " and --to " + last);
    }
    return new Selection(
        first, last, every == null ? 0 : SweepOptions.atLeastOne("--every", every));
  }

  Region region(Scenario scenario) {
    return file == null
        ? Region.along(scenario, selection())
        : Region.told(scenario, ToldPoints.read(file, scenario));
  }
}

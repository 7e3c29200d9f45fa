package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.JsonNode;
import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.DecimalNumber;
import java.io.PrintWriter;
import java.util.Locale;
import java.util.Map;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Guards against loss of accuracy from one file of results to another. Cost is told and never judged. */
@Command(
    name = "compare",
    description = "Compares two files by replay, sweep or weigh: exit code 1 if accuracy was lost.")
final class CompareCommand implements Callable<Integer> {
  @Parameters(index = "0", paramLabel = "OLD", description = "the earlier file")
  private String older;

  @Parameters(index = "1", paramLabel = "NEW", description = "the later file, of the same case")
  private String newer;

  @Option(
      names = "--allow",
      paramLabel = "SHARE",
      description = "how much a number may grow, as a share of it (default 0.05)")
  private String allow = "0.05";

  @Spec
  private CommandSpec spec;

  @Override
  public Integer call() {
    double allowed = allowed();
    JsonNode before = ResultsFile.read(older);
    JsonNode after = ResultsFile.read(newer);
    for (String same : new String[] {"case", "tolerance", "track"}) {
      if (!before.path(same).equals(after.path(same))) {
        throw new BadInputException("files must have the same " + same + ", got "
            + before.path(same) + " and " + after.path(same));
      }
    }
    if (before.has("runs") != after.has("runs")) {
      throw new BadInputException("files must be by the same command: " + older + ", " + newer);
    }
    PrintWriter console = spec.commandLine().getOut();
    int losses = compare(Figures.of(before), Figures.of(after), allowed, console);
    console.flush();
    return losses == 0 ? 0 : 1;
  }

  private double allowed() {
    double share = DecimalNumber.parse(allow).orElse(Double.NaN);
    if (!(share >= 0)) {
      throw new BadInputException("--allow must be a number, 0 or more, got '" + allow + "'");
    }
    return share;
  }

  private static int compare(Figures before, Figures after, double allowed, PrintWriter out) {
    after.cost().forEach((name, value) -> {
      Double old = before.cost().get(name);
      if (old != null && Math.abs(value - old) > allowed * old) {
        tell(out, "cost", name, old, value);
      }
    });
    int losses = 0;
    for (Map.Entry<String, Double> figure : before.accuracy().entrySet()) {
      double old = figure.getValue();
      // What is no longer there is lost.
      double value = after.accuracy().getOrDefault(figure.getKey(), Double.POSITIVE_INFINITY);
      if (value > old * (1 + allowed)) {
        losses++;
        tell(out, "LOSS", figure.getKey(), old, value);
      }
    }
    out.println(losses + " losses among " + before.accuracy().size() + " numbers of accuracy");
    return losses;
  }

  private static void tell(PrintWriter out, String what, String name, double old, double value) {
    out.printf(Locale.ROOT, "%s %s %.6g -> %.6g%n", what, name, old, value);
  }
}

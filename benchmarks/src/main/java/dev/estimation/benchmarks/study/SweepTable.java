package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.weigh.ScenarioChange;
import java.io.PrintWriter;
import java.util.Locale;

/** Prints the runs of a sweep, a line each; what does not exist is a dash. */
final class SweepTable {
  private static final String ROW = "%-24s %8s %8s  %10s %10s %10s %9s %10s %14s%n";

  private final PrintWriter out;
  private String title = "";

  SweepTable(PrintWriter out) {
    this.out = out;
  }

  void print(ScenarioChange change, LabelledRun run) {
    String next = run.variant().label() + " (variant " + run.variant().name() + ")";
    if (!next.equals(title)) {
      title = next;
      out.println();
      out.println(title);
      out.printf(
          ROW, "", "noise", "lag", "position", "error (m)", "NEES", "inside", "NIS per", "log");
      out.printf(
          ROW, "method", "scale", "(s)", "rmse", "max", "mean", "95 %", "degree", "likelihood");
    }
    RunResult result = run.result().orElseThrow();
    Accuracy accuracy = result.accuracy();
    out.printf(
        ROW,
        run.name(),
        number(change.noiseScale()),
        number(change.lag()),
        number(accuracy.position().rmse()),
        number(accuracy.position().max()),
        number(accuracy.neesMean()),
        number(100 * accuracy.insideFraction()),
        number(result.innovations().map(Innovations::meanPerDegree).orElse(Double.NaN)),
        number(result.innovations().map(Innovations::logLikelihood).orElse(Double.NaN)));
    if (!run.status().equals(RunResult.OK)) {
      out.println("  " + run.name() + ": " + run.status());
    }
  }

  private static String number(double value) {
    return Double.isNaN(value) ? "-" : String.format(Locale.ROOT, "%.4g", value);
  }
}

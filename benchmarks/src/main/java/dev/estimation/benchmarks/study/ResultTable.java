package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.filters.consistency.ChiSquareBounds;
import java.io.PrintWriter;
import java.util.Locale;

/** Prints runs as one table a variant, as they come. */
final class ResultTable {
  private final PrintWriter out;
  private String title = "";
  private int degreesOfFreedom;

  ResultTable(PrintWriter out) {
    this.out = out;
  }

  void print(LabelledRun run) {
    String next = run.variant().label() + " (variant " + run.variant().name() + ")";
    if (!next.equals(title)) {
      title = next;
      printHead();
    }
    if (run.result().isPresent()) {
      printRow(run.method(), run.result().get());
    }
    if (!run.status().equals(RunResult.OK)) {
      out.println("  " + run.method() + ": " + run.status());
    }
    out.flush();
  }

  private void printHead() {
    out.println();
    out.println(title);
    row("", "position", "error (m)", "NEES", "inside", "NIS per", "gated", "", "", "time per");
    row(
        "method",
        "rmse",
        "max",
        "mean",
        "95 %",
        "degree",
        "rows",
        "evaluations",
        "Jacobians",
        "step (us)");
  }

  private void printRow(String method, RunResult result) {
    Accuracy accuracy = result.accuracy();
    Innovations innovations = result.innovations();
    degreesOfFreedom = Math.max(degreesOfFreedom, accuracy.degreesOfFreedom());
    row(
        method,
        number(accuracy.rmse()),
        number(accuracy.max()),
        number(accuracy.neesMean()),
        percent(accuracy.insideFraction()),
        number(innovations.meanPerDegree()),
        innovations.rejectedRows().size(),
        result.effort().evaluations(),
        result.effort().jacobians(),
        number(result.nanosPerStep() / 1000));
  }

  private void row(Object... cells) {
    out.printf(Locale.ROOT, "%-22s %10s %10s %10s %8s %10s %6s %12s %10s %10s%n", cells);
  }

  /** Prints how to read the columns. */
  void printNotes() {
    out.println();
    if (degreesOfFreedom > 0) {
      ChiSquareBounds bounds = ChiSquareBounds.twoSided(0.95, degreesOfFreedom);
      out.printf(
          Locale.ROOT,
          "NEES: normalised error squared of the position, %d degrees of freedom. Honest"
              + " covariances have a mean%n  of about %d and 95 %% of the values inside"
              + " [%.3f, %.3f] (column inside 95 %%).%n",
          degreesOfFreedom,
          degreesOfFreedom,
          bounds.lower(),
          bounds.upper());
    }
    out.println("NIS: normalised innovation squared of accepted rows; honest: about 1 per degree.");
    out.println(
        "Time: wall clock of one pass over the steps, without warm-up; it is not a benchmark.");
    out.flush();
  }

  private static String number(double value) {
    return Double.isNaN(value) ? "-" : String.format(Locale.ROOT, "%.4g", value);
  }

  private static String percent(double share) {
    return Double.isNaN(share) ? "-" : String.format(Locale.ROOT, "%.1f", 100 * share);
  }
}

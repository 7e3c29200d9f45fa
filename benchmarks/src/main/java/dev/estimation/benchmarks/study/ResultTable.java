package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Score;
import dev.estimation.filters.consistency.ChiSquareBounds;
import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Prints runs as one table a variant, as they come. A smoothed run has a line of its own; what it
 * does not have is a dash. Headings have columns where truth tells them.
 */
final class ResultTable {
  private final PrintWriter out;
  private final String methodColumn;
  private String title = "";
  private boolean headed;
  private int degreesOfFreedom;
  private final List<String> remarks = new ArrayList<>();

  /**
   * A table.
   *
   * @param nameWidth characters of the longest name of a run
   */
  ResultTable(PrintWriter out, int nameWidth) {
    this.out = out;
    this.methodColumn = "%-" + nameWidth + "s";
  }

  void print(LabelledRun run) {
    String next = run.variant().label() + " (variant " + run.variant().name() + ")";
    if (!next.equals(title)) {
      printRemarks();
      title = next;
      headed = run.result().map(RunResult::accuracy).flatMap(Accuracy::heading).isPresent();
      printHead();
    }
    if (run.result().isPresent()) {
      printRow(run.name(), run.result().get());
    }
    run.result()
        .filter(result -> result.stepsBelowTolerance() > 0)
        .ifPresent(result -> remarks.add("  " + run.name() + ": " + result.stepsBelowTolerance()
            + " of " + result.steps() + " steps below tolerance"));
    if (!run.status().equals(RunResult.OK)) {
      out.println("  " + run.name() + ": " + run.status());
    }
    out.flush();
  }

  private void printHead() {
    out.println();
    out.println(title);
    begin("", "position", "error (m)");
    if (headed) {
      out.printf(" %10s %11s", "heading", "error (rad)");
    }
    end("NEES", "inside", "NIS per", "gated", "evaluations", "Jacobians", "time per");
    begin("method", "rmse", "max");
    if (headed) {
      out.printf(" %10s %11s", "rmse", "max");
    }
    end("mean", "95 %", "degree", "rows", "a step", "a step", "step (us)");
  }

  private void printRow(String name, RunResult result) {
    Accuracy accuracy = result.accuracy();
    if (accuracy.count() > 0) {
      degreesOfFreedom = accuracy.degreesOfFreedom();
    }
    begin(name, number(accuracy.position().rmse()), number(accuracy.position().max()));
    if (headed) {
      Score heading = accuracy.heading().orElse(new Score(Double.NaN, Double.NaN));
      out.printf(" %10s %11s", number(heading.rmse()), number(heading.max()));
    }
    Optional<Innovations> innovations = result.innovations();
    end(
        number(accuracy.neesMean()),
        percent(accuracy.insideFraction()),
        number(innovations.map(Innovations::meanPerDegree).orElse(Double.NaN)),
        innovations.map(said -> "" + said.rejectedRows().size()).orElse("-"),
        number((double) result.effort().evaluations() / result.steps()),
        number((double) result.effort().jacobians() / result.steps()),
        number(result.nanosPerStep() / 1000));
  }

  private void begin(String name, String rmse, String max) {
    out.printf(methodColumn + " %10s %10s", name, rmse, max);
  }

  private void end(Object... cells) {
    out.printf(" %10s %8s %10s %6s %12s %10s %10s%n", cells);
  }

  /** What is to be said under the table of a variant. */
  private void printRemarks() {
    remarks.forEach(out::println);
    remarks.clear();
  }

  /** Prints how to read the columns. */
  void printNotes() {
    printRemarks();
    out.println();
    if (degreesOfFreedom > 0) {
      ChiSquareBounds bounds = ChiSquareBounds.twoSided(0.95, degreesOfFreedom);
      out.printf(
          Locale.ROOT,
          "NEES: normalised error squared of the %s, %d degrees of freedom. Honest"
              + " covariances have a mean%n  of about %d and 95 %% of the values inside"
              + " [%.3f, %.3f] (column inside 95 %%).%n",
          headed ? "position and heading" : "position",
          degreesOfFreedom,
          degreesOfFreedom,
          bounds.lower(),
          bounds.upper());
    }
    out.println("NIS: normalised innovation squared of accepted rows; honest: about 1 per degree.");
    out.println(
        "Time: wall clock of one pass over the steps, after one untimed; rough, not a benchmark.");
    out.flush();
  }

  private static String number(double value) {
    return Double.isNaN(value) ? "-" : String.format(Locale.ROOT, "%.4g", value);
  }

  private static String percent(double share) {
    return Double.isNaN(share) ? "-" : String.format(Locale.ROOT, "%.1f", 100 * share);
  }
}

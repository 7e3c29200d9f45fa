package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.weigh.FunctionWeight;
import dev.estimation.benchmarks.weigh.MethodWeight;
import dev.estimation.benchmarks.weigh.Quantiles;
import dev.estimation.benchmarks.weigh.Recommendation;
import dev.estimation.benchmarks.weigh.WeighedRun;
import java.io.PrintWriter;
import java.util.Locale;

/** Prints weighings: a table a function, and the recommendation. */
final class WeighTable {
  private final PrintWriter out;
  private final String methodColumn;
  private final double tolerance;

  WeighTable(PrintWriter out, int nameWidth, double tolerance) {
    this.out = out;
    this.methodColumn = "%-" + Math.max(6, nameWidth) + "s";
    this.tolerance = tolerance;
  }

  void print(
      LoadedVariant variant, double noiseScale, WeighedRun run, Recommendation recommendation) {
    out.println();
    out.println(variant.label() + " (variant " + variant.name() + ")"
        + (noiseScale == 1 ? "" : ", noise scale " + noiseScale));
    if (!run.status().equals(RunResult.OK)) {
      out.println("  the run that gives the points: " + run.status());
    }
    run.functions().forEach(this::print);
    out.println();
    out.println("RECOMMENDED " + recommendation.method().orElse("none"));
    out.println("  " + recommendation.reason());
    out.flush();
  }

  void printAbsent(LoadedVariant variant, String reason) {
    out.println();
    out.println(variant.label() + " (variant " + variant.name() + ")");
    out.println("  " + line(reason));
  }

  private void print(FunctionWeight function) {
    out.println();
    out.println(head(function));
    if (function.unknown() > 0) {
      out.println(
          "  " + function.unknown() + " points have no truth: " + line(function.firstUnknown()));
    }
    if (function.points() > 0 && function.isExact()) {
      out.println("  linear: exact by every method (what each costs is in weigh.json)");
      function.methods().stream()
          .filter(method -> !method.serves())
          .forEach(method -> printRow(function, method));
    } else if (function.points() > 0) {
      printHead();
      function.methods().forEach(method -> printRow(function, method));
    }
  }

  private static String head(FunctionWeight function) {
    String name = function.name() + (function.motion() ? " (prediction): " : " (update): ");
    if (function.points() == 0) {
      return name + "no points";
    }
    double uncertainty = function.uncertainty().largest();
    return name
        + String.format(
            Locale.ROOT,
            "%d points, %.3g calls a step, nonlinear in %d inputs; truth %s%s",
            function.points(),
            function.callsPerStep(),
            function.nonlinearInputs(),
            uncertainty == 0 ? "exact" : String.format(Locale.ROOT, "known to %.0e", uncertainty),
            function.notConverged() == 0 ? "" : ", not smooth at " + function.notConverged());
  }

  private void printHead() {
    String above = "above " + Recommendation.percent(tolerance);
    row("", "error:", "", "", "", "", "evaluations", "Jacobians", "time a", "front of error");
    row(
        "method",
        "median",
        "90 %",
        "99 %",
        "largest",
        above,
        "median/most",
        "",
        "call (us)",
        "and");
  }

  private void printRow(FunctionWeight function, MethodWeight weight) {
    if (!weight.serves()) {
      out.printf(methodColumn + "  cannot serve: %s%n", weight.method(), line(weight.refusal()));
      return;
    }
    Quantiles error = weight.error();
    row(
        weight.method(),
        small(error.median()),
        small(error.most()),
        small(error.nearlyAll()),
        small(error.largest()),
        String.format(Locale.ROOT, "%.1f %%", 100 * weight.shareAbove()),
        range(weight.evaluations()),
        range(weight.jacobians()),
        Double.isNaN(weight.micros()) ? "-" : String.format(Locale.ROOT, "%.3g", weight.micros()),
        fronts(function, weight.method()));
    if (weight.failures() > 0) {
      out.println("  " + weight.method() + " failed at " + weight.failures() + " points, first: "
          + line(weight.firstFailure()));
    }
  }

  private static String fronts(FunctionWeight function, String method) {
    boolean byTime = function.frontByTime().contains(method);
    boolean byEvaluations = function.frontByEvaluations().contains(method);
    return (byEvaluations ? "evaluations" : "")
        + (byTime && byEvaluations ? ", " : "")
        + (byTime ? "time" : "");
  }

  private void row(String name, Object... cells) {
    String rest = String.format(" %8s %8s %8s %8s %11s %12s %10s %10s  %s", cells);
    out.println((String.format(methodColumn, name) + rest).stripTrailing());
  }

  void printNotes() {
    out.println();
    out.println(
        "Error: the largest of the errors of mean, covariance and cross-covariance where they are used, in standard"
            + "\n  deviations (a variance: relative) of the next estimate, or of what a measurement says beyond its regression.");
    out.println(
        "Front: no other method is better in both. Time: the calls alone, one thread; rough, not a benchmark.");
  }

  private static String small(double value) {
    return String.format(Locale.ROOT, "%.1e", value);
  }

  private static String range(Quantiles counts) {
    return counts.median() == counts.largest()
        ? String.format(Locale.ROOT, "%.0f", counts.median())
        : String.format(Locale.ROOT, "%.0f/%.0f", counts.median(), counts.largest());
  }

  private static String line(String text) {
    return text.replaceAll("\\s+", " ");
  }
}

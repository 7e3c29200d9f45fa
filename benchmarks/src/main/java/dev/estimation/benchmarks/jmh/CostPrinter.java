package dev.estimation.benchmarks.jmh;

import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;

/** Costs and accuracies as text, a table for each problem with the fastest first. */
final class CostPrinter {
  private final PrintWriter out;

  CostPrinter(PrintWriter out) {
    this.out = out;
  }

  void printRows(List<CostRow> rows) {
    out.println(
        "Time of a call beside its errors against converged moments (MatchingError); the median of"
            + " iterations, the least and the most."
            + " *: on the front of time and the larger error.");
    Map<String, List<CostRow>> byProblem = new LinkedHashMap<>();
    for (CostRow row : rows) {
      byProblem
          .computeIfAbsent(row.timing().subject(), name -> new ArrayList<>())
          .add(row);
    }
    byProblem.forEach(this::printProblem);
  }

  private void printProblem(String problem, Collection<CostRow> rows) {
    double uncertainty = rows.iterator().next().accuracy().uncertainty();
    out.printf(
        Locale.ROOT,
        "%n%s (error of the reference about %.1e)%n%2s%-14s %10s %10s %10s %10s %8s %6s %5s %10s %10s%n",
        problem,
        uncertainty,
        "",
        "matching",
        "ns/call",
        "least",
        "most",
        "model ns",
        "B/call",
        "eval",
        "jac",
        "mean",
        "covariance");
    rows.stream()
        .sorted((one, other) -> Double.compare(one.nanos(), other.nanos()))
        .forEach(this::printRow);
  }

  private void printRow(CostRow row) {
    CarryAccuracy accuracy = row.accuracy();
    out.printf(
        Locale.ROOT,
        "%-2s%-14s %10.0f %10.0f %10.0f %10s %8.1f %6d %5d %10.1e %10.1e%n",
        row.onFront() ? "*" : "",
        row.timing().matching(),
        row.nanos(),
        row.timing().least(),
        row.timing().most(),
        rounded(row.model()),
        row.timing().bytes(),
        accuracy.evaluations(),
        accuracy.jacobians(),
        accuracy.mean(),
        accuracy.covariance());
  }

  private static String rounded(OptionalDouble nanos) {
    return nanos.isPresent() ? String.format(Locale.ROOT, "%.0f", nanos.getAsDouble()) : "-";
  }

  void printCurves(List<ScalingCurve> curves) {
    out.printf(
        "%nTime of a call against n inputs and outputs; slope of log time against log n, n from %d on%n",
        ScalingCurve.FIRST_FITTED);
    for (ScalingCurve curve : curves) {
      out.printf(
          Locale.ROOT,
          "  %-14s slope %.2f, theory %.0f;",
          curve.matching().label(),
          curve.slope(),
          curve.matching().power());
      for (Timing point : curve.points()) {
        out.printf(Locale.ROOT, "  %s: %.0f ns", point.subject(), point.nanos());
      }
      out.println();
    }
  }
}

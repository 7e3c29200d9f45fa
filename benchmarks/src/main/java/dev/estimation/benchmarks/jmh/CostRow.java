package dev.estimation.benchmarks.jmh;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * A matching at a problem: what a call costs beside how accurate it is.
 *
 * @param timing of the call
 * @param model of the function's calls alone (ns), where it was measured
 * @param accuracy against the converged moments
 * @param onFront whether no other matching of this problem is as fast and as accurate and better in one of the two
 */
record CostRow(Timing timing, OptionalDouble model, CarryAccuracy accuracy, boolean onFront) {

  /** Joins what was timed with accuracies, which are found here. */
  static List<CostRow> of(List<Timing> timings) {
    Map<String, CarryAccuracy.Truth> truths = new HashMap<>();
    List<CostRow> rows = new ArrayList<>();
    for (Timing timing : timings) {
      if (timing.part().equals("carry")) {
        CarryAccuracy.Truth truth = truths.computeIfAbsent(
            timing.subject(), name -> new CarryAccuracy.Truth(CarryProblem.of(name)));
        rows.add(new CostRow(
            timing,
            Timing.ofModel(timings, timing.subject(), timing.matching()),
            truth.of(ComparedMatching.named(timing.matching())),
            false));
      }
    }
    return marked(rows);
  }

  /** {@return the same rows, those on the front of their problem marked} */
  static List<CostRow> marked(List<CostRow> rows) {
    return rows.stream()
        .map(row -> new CostRow(
            row.timing, row.model, row.accuracy, rows.stream().noneMatch(row::isBeatenBy)))
        .toList();
  }

  private boolean isBeatenBy(CostRow other) {
    return other.timing.subject().equals(timing.subject())
        && other.nanos() <= nanos()
        && other.error() <= error()
        && (other.nanos() < nanos() || other.error() < error());
  }

  double nanos() {
    return timing.nanos();
  }

  double error() {
    return accuracy.error();
  }
}

package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.RunTrace;
import dev.estimation.filters.filter.StepStatus;
import java.util.Optional;

/** What the page's table tells of a run, over all its steps and not only those drawn. What does not exist is not there. */
final class TableRow {
  private final RunResult result;
  private final Optional<RunTrace> trace;

  TableRow(RunResult result, Optional<RunTrace> trace) {
    this.result = result;
    this.trace = trace;
  }

  void fill(ObjectNode node) {
    node.put("steps", result.steps());
    Accuracy accuracy = result.accuracy();
    if (accuracy.count() > 0) {
      Numbers.put(node, "rmse", accuracy.position().rmse());
      Numbers.put(node, "max", accuracy.position().max());
      accuracy.heading().ifPresent(heading -> Numbers.put(node, "headingRmse", heading.rmse()));
      Numbers.put(node, "nees", accuracy.neesMean());
      Numbers.put(node, "inside", accuracy.insideFraction());
      node.put("degrees", accuracy.degreesOfFreedom());
    }
    result.innovations().ifPresent(said -> fillRows(node, said));
    if (result.steps() > 0) {
      Numbers.put(node, "micros", result.nanosPerStep() / 1000);
    }
  }

  private void fillRows(ObjectNode node, Innovations said) {
    if (said.accepted() > 0) {
      Numbers.put(node, "nis", said.meanPerDegree());
    }
    node.put("gated", said.rejectedRows().size());
    node.put("skipped", trace.map(TableRow::skipped).orElse(0L));
    node.put("belowTolerance", result.stepsBelowTolerance());
    if (result.steps() > 0) {
      Numbers.put(node, "evaluations", (double) result.effort().evaluations() / result.steps());
      Numbers.put(node, "jacobians", (double) result.effort().jacobians() / result.steps());
    }
  }

  private static long skipped(RunTrace trace) {
    return trace.updates().stream()
        .filter(update -> update.status() == StepStatus.NOT_CONVERGED)
        .count();
  }
}

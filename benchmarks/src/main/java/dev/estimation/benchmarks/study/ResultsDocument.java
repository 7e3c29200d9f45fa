package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Snapshot;
import dev.estimation.core.gaussian.Gaussian;

/** Runs as JSON. A number that does not exist is null, never zero and never NaN. */
final class ResultsDocument {
  private final ObjectNode root = JsonNodeFactory.instance.objectNode();
  private final ArrayNode runs;

  /**
   * A document without runs.
   *
   * @param log as typed; null if there is none
   */
  ResultsDocument(String caseName, String log) {
    root.put("case", caseName);
    root.put("log", log);
    this.runs = root.putArray("runs");
  }

  ObjectNode root() {
    return root;
  }

  void add(LabelledRun run) {
    ObjectNode node = runs.addObject();
    node.put("label", run.variant().label());
    node.put("variant", run.variant().name());
    node.put("method", run.method());
    node.put("wholeState", run.wholeState());
    node.put("smoothed", false);
    node.put("status", run.status());
    run.result().ifPresentOrElse(result -> fill(node, result), () -> fillAbsent(node));
  }

  private static void fill(ObjectNode node, RunResult result) {
    node.put("steps", result.steps());
    node.put("evaluations", result.effort().evaluations());
    node.put("jacobians", result.effort().jacobians());
    putNumber(node, "nanosPerStep", result.nanosPerStep());
    Innovations innovations = result.innovations();
    ArrayNode rejected = node.putArray("rejectedRows");
    innovations.rejectedRows().forEach(rejected::add);
    putNumber(node, "logLikelihood", innovations.logLikelihood());
    putAccuracy(node, result.accuracy());
    putInnovations(node, innovations);
    putFinal(node, result);
    ArrayNode checkpoints = node.putArray("checkpoints");
    for (Snapshot snapshot : result.checkpoints()) {
      ObjectNode checkpoint = checkpoints.addObject();
      checkpoint.put("step", snapshot.step());
      putEstimate(checkpoint, snapshot);
    }
  }

  private static void fillAbsent(ObjectNode node) {
    node.put("steps", 0);
    node.putNull("evaluations");
    node.putNull("jacobians");
    node.putNull("nanosPerStep");
    node.putArray("rejectedRows");
    node.putNull("logLikelihood");
    node.putObject("scores").putNull("position");
    node.putNull("nees");
    node.putNull("nis");
    node.putNull("final");
    node.putArray("checkpoints");
  }

  private static void putAccuracy(ObjectNode node, Accuracy accuracy) {
    ObjectNode scores = node.putObject("scores");
    if (accuracy.count() == 0) {
      scores.putNull("position");
      node.putNull("nees");
      return;
    }
    ObjectNode position = scores.putObject("position");
    putNumber(position, "rmse", accuracy.rmse());
    putNumber(position, "max", accuracy.max());
    ObjectNode nees = node.putObject("nees");
    nees.put("degreesOfFreedom", accuracy.degreesOfFreedom());
    putNumber(nees, "mean", accuracy.neesMean());
    putNumber(nees, "insideFraction", accuracy.insideFraction());
  }

  private static void putInnovations(ObjectNode node, Innovations innovations) {
    if (innovations.accepted() == 0) {
      node.putNull("nis");
    } else {
      putNumber(node.putObject("nis"), "meanPerDegree", innovations.meanPerDegree());
    }
  }

  private static void putFinal(ObjectNode node, RunResult result) {
    if (result.steps() == 0) {
      node.putNull("final");
    } else {
      putEstimate(node.putObject("final"), result.history().get(result.steps() - 1));
    }
  }

  private static void putEstimate(ObjectNode node, Snapshot snapshot) {
    Gaussian estimate = snapshot.estimate();
    putNumber(node, "time", snapshot.time());
    ArrayNode mean = node.putArray("mean");
    ArrayNode covariance = node.putArray("covariance");
    for (int i = 0; i < estimate.dimension(); i++) {
      mean.add(estimate.mean(i));
      ArrayNode row = covariance.addArray();
      for (int j = 0; j < estimate.dimension(); j++) {
        row.add(estimate.covariance(i, j));
      }
    }
  }

  private static void putNumber(ObjectNode node, String name, double value) {
    if (Double.isFinite(value)) {
      node.put(name, value);
    } else {
      node.putNull(name);
    }
  }
}

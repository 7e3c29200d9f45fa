package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Score;
import dev.estimation.benchmarks.replay.Snapshot;
import dev.estimation.core.gaussian.Gaussian;

/**
 * Runs as JSON. What does not exist is null, never zero and never NaN. A smoothed run has no
 * innovations: its rejected rows are null too, since an empty list would say that none were rejected.
 * It asks no model, so its evaluations and Jacobians are 0; its time is that of the way back alone.
 */
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

  /** The document, to which runs may still be added. */
  ObjectNode root() {
    return root;
  }

  /**
   * Adds a run.
   *
   * @param stepsFile the name of the file with its steps; null if there is none
   */
  void add(LabelledRun run, String stepsFile) {
    ObjectNode node = runs.addObject();
    node.put("label", run.variant().label());
    node.put("variant", run.variant().name());
    node.put("method", run.method());
    node.put("wholeState", run.wholeState());
    node.put("squareRoot", run.squareRoot());
    node.put("smoothed", run.smoothed());
    node.put("status", run.status());
    node.put("stepsFile", stepsFile);
    run.result()
        .ifPresentOrElse(result -> fill(node, result), () -> fillAbsent(node, run.smoothed()));
  }

  private static void fill(ObjectNode node, RunResult result) {
    node.put("steps", result.steps());
    if (result.innovations().isPresent()) {
      node.put("stepsBelowTolerance", result.stepsBelowTolerance());
    } else {
      node.putNull("stepsBelowTolerance");
    }
    node.put("evaluations", result.effort().evaluations());
    node.put("jacobians", result.effort().jacobians());
    putNumber(node, "nanosPerStep", result.nanosPerStep());
    result.innovations().ifPresentOrElse(said -> putRows(node, said), () -> putNoRows(node));
    putAccuracy(node, result.accuracy());
    result
        .innovations()
        .filter(said -> said.accepted() > 0)
        .ifPresentOrElse(
            said -> putNumber(node.putObject("nis"), "meanPerDegree", said.meanPerDegree()),
            () -> node.putNull("nis"));
    putFinal(node, result);
    ArrayNode checkpoints = node.putArray("checkpoints");
    for (Snapshot snapshot : result.checkpoints()) {
      ObjectNode checkpoint = checkpoints.addObject();
      checkpoint.put("step", snapshot.step());
      putEstimate(checkpoint, snapshot);
    }
  }

  private static void putRows(ObjectNode node, Innovations innovations) {
    ArrayNode rejected = node.putArray("rejectedRows");
    innovations.rejectedRows().forEach(rejected::add);
    putNumber(node, "logLikelihood", innovations.logLikelihood());
  }

  private static void putNoRows(ObjectNode node) {
    node.putNull("rejectedRows");
    node.putNull("logLikelihood");
  }

  private static void fillAbsent(ObjectNode node, boolean smoothed) {
    node.put("steps", 0);
    node.putNull("stepsBelowTolerance");
    node.putNull("evaluations");
    node.putNull("jacobians");
    node.putNull("nanosPerStep");
    if (smoothed) {
      node.putNull("rejectedRows");
    } else {
      node.putArray("rejectedRows");
    }
    node.putNull("logLikelihood");
    node.putObject("scores").putNull("position");
    node.putNull("nees");
    node.putNull("nis");
    node.putNull("final");
    node.putArray("checkpoints");
  }

  private static void putAccuracy(ObjectNode node, Accuracy accuracy) {
    ObjectNode scores = node.putObject("scores");
    putScore(scores, "position", accuracy.position());
    accuracy.heading().ifPresent(heading -> putScore(scores, "heading", heading));
    if (accuracy.count() == 0) {
      node.putNull("nees");
      return;
    }
    ObjectNode nees = node.putObject("nees");
    nees.put("degreesOfFreedom", accuracy.degreesOfFreedom());
    putNumber(nees, "mean", accuracy.neesMean());
    putNumber(nees, "insideFraction", accuracy.insideFraction());
  }

  private static void putScore(ObjectNode scores, String name, Score score) {
    if (Double.isNaN(score.rmse())) {
      scores.putNull(name);
      return;
    }
    ObjectNode node = scores.putObject(name);
    putNumber(node, "rmse", score.rmse());
    putNumber(node, "max", score.max());
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
    for (double number : estimate.mean()) {
      mean.add(number);
    }
    ArrayNode covariance = node.putArray("covariance");
    for (int i = 0; i < estimate.dimension(); i++) {
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

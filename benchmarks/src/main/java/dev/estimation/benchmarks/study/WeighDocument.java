package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.weigh.FunctionWeight;
import dev.estimation.benchmarks.weigh.MethodWeight;
import dev.estimation.benchmarks.weigh.Quantiles;
import dev.estimation.benchmarks.weigh.Recommendation;
import dev.estimation.benchmarks.weigh.WeighedRun;

/** Weighings as JSON. What does not exist, and what is infinite, is null. */
final class WeighDocument {
  private final ObjectNode root = JsonNodeFactory.instance.objectNode();
  private final ArrayNode weighings;

  WeighDocument(CaseOptions cases, double tolerance, String track) {
    root.put("case", cases.name());
    root.put("log", cases.log());
    root.put("tolerance", tolerance);
    root.put("track", track);
    this.weighings = root.putArray("weighings");
  }

  ObjectNode root() {
    return root;
  }

  boolean isEmpty() {
    return weighings.isEmpty();
  }

  void add(
      LoadedVariant variant, double noiseScale, WeighedRun run, Recommendation recommendation) {
    ObjectNode node = weighings.addObject();
    node.put("label", variant.label());
    node.put("variant", variant.name());
    node.put("noiseScale", noiseScale);
    node.put("status", run.status().replaceAll("\\s+", " "));
    ObjectNode recommended = node.putObject("recommendation");
    recommended.put("method", recommendation.method().orElse(null));
    recommended.put("suffices", recommendation.suffices());
    recommended.put("reason", recommendation.reason());
    ArrayNode functions = node.putArray("functions");
    run.functions().forEach(function -> fill(functions.addObject(), function));
  }

  private static void fill(ObjectNode node, FunctionWeight function) {
    node.put("name", function.name());
    node.put("use", function.motion() ? "prediction" : "update");
    node.put("callsPerStep", function.callsPerStep());
    node.put("points", function.points());
    node.put("pointsWithoutTruth", function.unknown());
    node.put("pointsNotSmooth", function.notConverged());
    node.put("nonlinearInputs", function.nonlinearInputs());
    put(node.putObject("uncertainty"), function.uncertainty());
    node.put("cheapest", function.cheapest().map(MethodWeight::method).orElse(null));
    ArrayNode methods = node.putArray("methods");
    for (MethodWeight weight : function.methods()) {
      ObjectNode method = methods.addObject();
      fill(method, weight);
      method.put("onFrontOfEvaluations", function.frontByEvaluations().contains(weight.method()));
      method.put("onFrontOfTime", function.frontByTime().contains(weight.method()));
    }
  }

  private static void fill(ObjectNode node, MethodWeight weight) {
    node.put("method", weight.method());
    node.put("serves", weight.serves());
    put(node.putObject("error"), weight.error());
    putNumber(node, "shareAbove", weight.shareAbove());
    put(node.putObject("evaluations"), weight.evaluations());
    put(node.putObject("jacobians"), weight.jacobians());
    putNumber(node, "microseconds", weight.micros());
    node.put("failures", weight.failures());
    node.put("firstFailure", weight.firstFailure().isEmpty() ? null : weight.firstFailure());
  }

  private static void put(ObjectNode node, Quantiles quantiles) {
    putNumber(node, "median", quantiles.median());
    putNumber(node, "ninetyPercent", quantiles.most());
    putNumber(node, "ninetyNinePercent", quantiles.nearlyAll());
    putNumber(node, "largest", quantiles.largest());
  }

  private static void putNumber(ObjectNode node, String name, double value) {
    node.put(name, Double.isFinite(value) ? (Double) value : null);
  }
}

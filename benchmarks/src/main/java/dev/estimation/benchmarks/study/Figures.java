package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * The numbers of a file of results, by name: accuracy, where larger is worse, and cost. Of a mean NEES and NIS it is the
 * ratio to the honest value, or the other way round, whichever is above 1. An error that is infinite, and so null in the
 * file, is infinite here. Errors of methods below a hundredth of the tolerance count as that: they are no loss to anybody.
 */
final class Figures {
  private static final double NEGLIGIBLE = 0.01;

  private final Map<String, Double> accuracy = new LinkedHashMap<>();
  private final Map<String, Double> cost = new LinkedHashMap<>();

  private Figures() {}

  /** {@return the figures of a file by {@code replay}, {@code sweep} or {@code weigh}} */
  static Figures of(JsonNode root) {
    Figures figures = new Figures();
    root.path("runs").forEach(figures::addRun);
    double floor = NEGLIGIBLE * root.path("tolerance").asDouble();
    root.path("weighings").forEach(weighing -> figures.addWeighing(weighing, floor));
    return figures;
  }

  Map<String, Double> accuracy() {
    return accuracy;
  }

  Map<String, Double> cost() {
    return cost;
  }

  private void addRun(JsonNode run) {
    StringBuilder words = new StringBuilder(run.path("label").asText());
    words.append(' ').append(run.path("variant").asText());
    words.append(' ').append(run.path("method").asText());
    for (String form : new String[] {"wholeState", "squareRoot", "smoothed"}) {
      words.append(run.path(form).asBoolean() ? " " + form : "");
    }
    for (String change : new String[] {"noiseScale", "extraLag"}) {
      words.append(run.has(change) ? " " + change + " " + run.get(change).asDouble() : "");
    }
    String name = words + ": ";
    accuracy.put(name + "failure", run.path("status").asText().equals("ok") ? 0.0 : 1.0);
    for (String what : new String[] {"position", "heading"}) {
      putNumber(accuracy, name + what + " rmse", run.at("/scores/" + what + "/rmse"));
      putNumber(accuracy, name + what + " max", run.at("/scores/" + what + "/max"));
    }
    putRatio(
        name + "NEES ratio",
        run.at("/nees/mean"),
        run.at("/nees/degreesOfFreedom").asDouble());
    putRatio(name + "NIS ratio", run.at("/nis/meanPerDegree"), 1);
    for (String what : new String[] {"evaluations", "jacobians", "nanosPerStep"}) {
      putNumber(cost, name + what, run.path(what));
    }
  }

  private void addWeighing(JsonNode weighing, double floor) {
    String name =
        weighing.path("label").asText() + " " + weighing.path("variant").asText() + " noiseScale "
            + weighing.path("noiseScale").asDouble() + " ";
    accuracy.put(
        name + "recommendation: missing",
        weighing.at("/recommendation/method").isTextual() ? 0.0 : 1.0);
    for (JsonNode function : weighing.path("functions")) {
      for (JsonNode method : function.path("methods")) {
        addMethod(
            name + function.path("name").asText() + " " + method.path("method").asText() + ": ",
            method,
            floor);
      }
    }
  }

  private void addMethod(String name, JsonNode method, double floor) {
    boolean serves = method.path("serves").asBoolean();
    accuracy.put(name + "refusal", serves ? 0.0 : 1.0);
    if (!serves) {
      return;
    }
    for (String which : new String[] {"median", "ninetyPercent", "ninetyNinePercent", "largest"}) {
      JsonNode error = method.path("error").path(which);
      double value = error.isNumber() ? error.asDouble() : Double.POSITIVE_INFINITY;
      accuracy.put(name + "error " + which, Math.max(floor, value));
    }
    putNumber(accuracy, name + "share above tolerance", method.path("shareAbove"));
    putNumber(cost, name + "evaluations", method.at("/evaluations/median"));
    putNumber(cost, name + "jacobians", method.at("/jacobians/median"));
    putNumber(cost, name + "microseconds", method.path("microseconds"));
  }

  private void putRatio(String name, JsonNode value, double honest) {
    if (value.isNumber()) {
      double ratio = value.asDouble() / honest;
      accuracy.put(name, Math.max(ratio, 1 / ratio));
    }
  }

  private static void putNumber(Map<String, Double> figures, String name, JsonNode value) {
    if (value.isNumber()) {
      figures.put(name, value.asDouble());
    }
  }
}

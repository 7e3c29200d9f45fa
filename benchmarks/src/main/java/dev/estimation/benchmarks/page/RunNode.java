package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Snapshot;
import dev.estimation.benchmarks.replay.TruthComparison;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.benchmarks.replay.VariableNames.Plane;
import dev.estimation.core.gaussian.Gaussian;
import java.util.ArrayList;
import java.util.List;

/** A run as JSON: its row in the table, and the estimates that are drawn. */
final class RunNode {
  private final ObjectNode node = JsonNodeFactory.instance.objectNode();
  private final LoadedVariant variant;
  private final VariableNames names;
  private final Thinning thinning;
  private final Bounds bounds = new Bounds();

  RunNode(LoadedVariant variant, VariableNames names, Thinning thinning) {
    this.variant = variant;
    this.names = names;
    this.thinning = thinning;
  }

  ObjectNode of(PageRun run) {
    node.put("name", run.name());
    node.put("smoothed", run.smoothed());
    node.put("status", run.status());
    variant
        .scenario()
        .ifPresent(scenario -> run.result().ifPresent(result -> {
          new TableRow(result, run.trace()).fill(node.putObject("row"));
          putEstimates(scenario, result.history());
          scenario
              .truth()
              .ifPresent(truth -> putErrors(
                  new TruthComparison(scenario.motion().stateSpace(), truth), result.history()));
          run.trace()
              .filter(trace -> !trace.updates().isEmpty())
              .ifPresent(trace -> new UpdatesNode(scenario, names, thinning, bounds)
                  .fill(node.putObject("updates"), trace.updates()));
        }));
    return node;
  }

  private void putEstimates(Scenario scenario, List<Snapshot> history) {
    int dimension = scenario.motion().stateSpace().dimension();
    int storage = scenario.motion().stateSpace().storage();
    List<Plane> planes = names.planesOf(scenario.motion().stateSpace());
    ArrayNode times = node.put("stride", thinning.stride(history.size())).putArray("t");
    List<ArrayNode> means = arrays("mean", storage);
    List<ArrayNode> deviations = arrays("sd", dimension);
    List<ArrayNode> covariances = arrays("covariance", planes.size());
    double start = scenario.steps().get(0).time();
    thinning.of(history.size()).mapToObj(history::get).forEach(snapshot -> {
      Gaussian estimate = snapshot.estimate();
      Numbers.addPlace(times, snapshot.time() - start);
      for (int i = 0; i < storage; i++) {
        Numbers.addPlace(means.get(i), estimate.mean(i));
      }
      for (int i = 0; i < dimension; i++) {
        Numbers.add(deviations.get(i), estimate.standardDeviation(i));
      }
      for (int i = 0; i < planes.size(); i++) {
        Plane plane = planes.get(i);
        Numbers.add(covariances.get(i), estimate.covariance(plane.across(), plane.up()));
      }
    });
  }

  private List<ArrayNode> arrays(String name, int count) {
    ArrayNode outer = node.putArray(name);
    List<ArrayNode> inner = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      inner.add(outer.addArray());
    }
    return inner;
  }

  private void putErrors(TruthComparison truth, List<Snapshot> history) {
    List<ArrayNode> errors = arrays("error", truth.count());
    ObjectNode nees = node.putObject("nees");
    nees.put("degrees", truth.count());
    nees.put("lower", bounds.of(truth.count()).lower());
    nees.put("upper", bounds.of(truth.count()).upper());
    ArrayNode values = nees.putArray("value");
    ArrayNode verdicts = nees.putArray("verdict");
    thinning.of(history.size()).mapToObj(history::get).forEach(snapshot -> {
      boolean known = truth.compare(snapshot.time(), snapshot.estimate());
      for (int i = 0; i < errors.size(); i++) {
        Numbers.add(errors.get(i), known ? truth.error(i) : Double.NaN);
      }
      double squared = known ? truth.normalisedSquared() : Double.NaN;
      Numbers.add(values, squared);
      verdicts.add(bounds.judge(squared, truth.count()).code());
    });
  }
}

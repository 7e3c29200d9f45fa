package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Quantity;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.benchmarks.replay.Truth;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.benchmarks.replay.VariableNames.Plane;
import java.util.ArrayList;
import java.util.List;

/** A variant of a case as JSON: its truth, its runs, and clouds at some of its steps. */
final class VariantNode {
  private final ObjectNode node = JsonNodeFactory.instance.objectNode();
  private final LoadedVariant variant;
  private final VariableNames names;
  private final Thinning thinning;
  private final ArrayNode runs;
  private final List<CloudMethod> filters = new ArrayList<>();

  VariantNode(LoadedVariant variant, VariableNames names, Thinning thinning) {
    this.variant = variant;
    this.names = names;
    this.thinning = thinning;
    node.put("name", variant.name());
    node.put("label", variant.label());
    node.put("absence", variant.absence());
    this.runs = node.putArray("runs");
    variant.scenario().ifPresent(this::describe);
  }

  boolean isOf(LoadedVariant other) {
    return variant.name().equals(other.name());
  }

  private void describe(Scenario scenario) {
    node.put("start", scenario.steps().get(0).time());
    node.put("steps", scenario.steps().size());
    scenario.gateProbability().ifPresent(gate -> node.put("gate", gate));
    putQuantities(node.putArray("components"), names.stateOf(scenario.motion().stateSpace()));
    ArrayNode planes = node.putArray("planes");
    for (Plane plane : names.planesOf(scenario.motion().stateSpace())) {
      planes.addArray().add(plane.across()).add(plane.up());
    }
    scenario.truth().ifPresent(truth -> putTruth(scenario, truth));
  }

  static void putQuantities(ArrayNode array, List<Quantity> quantities) {
    for (Quantity quantity : quantities) {
      array.addObject().put("name", quantity.name()).put("unit", quantity.unit());
    }
  }

  private void putTruth(Scenario scenario, Truth truth) {
    ObjectNode known = node.putObject("truth");
    ArrayNode components = known.putArray("components");
    ArrayNode times = known.putArray("t");
    ArrayNode values = known.putArray("values");
    for (int component : truth.components()) {
      components.add(component);
      values.addArray();
    }
    double[] found = new double[components.size()];
    List<Step> steps = scenario.steps();
    thinning.of(steps.size()).forEach(i -> {
      double time = steps.get(i).time();
      boolean there = truth.at(time, found);
      Numbers.addPlace(times, time - steps.get(0).time());
      for (int j = 0; j < found.length; j++) {
        Numbers.addPlace((ArrayNode) values.get(j), there ? found[j] : Double.NaN);
      }
    });
    node.put("truthStride", thinning.stride(steps.size()));
  }

  void add(PageRun run) {
    runs.add(new RunNode(variant, names, thinning).of(run));
    if (!run.smoothed() && run.result().isPresent()) {
      filters.add(CloudMethod.of(run));
    }
  }

  /** {@return all, clouds included} */
  ObjectNode complete() {
    if (!node.has("clouds")) {
      ArrayNode clouds = node.putArray("clouds");
      variant
          .scenario()
          .ifPresent(scenario -> new Clouds(scenario, names, filters).addTo(node, clouds));
    }
    return node;
  }
}

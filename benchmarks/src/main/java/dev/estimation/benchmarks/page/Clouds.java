package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.VariableNames;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * Clouds at a few places of a variant, chosen among those that the costliest method comes through: where linearisation is
 * worst, and where it is as wrong as at half of the places.
 */
final class Clouds {
  private final Scenario scenario;
  private final VariableNames names;
  private final List<CloudMethod> methods;

  Clouds(Scenario scenario, VariableNames names, List<CloudMethod> methods) {
    this.scenario = scenario;
    this.names = names;
    this.methods = methods;
  }

  /** A place and how wrong linearisation is there. */
  private record Judged(CloudPoint point, double error) {}

  /** Adds clouds, and the name of the method whose estimates they start from. */
  void addTo(ObjectNode variant, ArrayNode clouds) {
    Optional<CloudMethod> costliest =
        methods.stream().max(Comparator.comparingLong(CloudMethod::evaluations));
    if (costliest.isEmpty()) {
      return;
    }
    variant.put("cloudsFrom", costliest.get().name());
    CloudSearch search = new CloudSearch(scenario);
    new Replayer(scenario, costliest.get().kind()).run(search);
    add(clouds, "measurement", search.updates());
    add(clouds, "motion", search.predictions());
  }

  private void add(ArrayNode clouds, String model, List<CloudPoint> places) {
    List<Judged> judged = new ArrayList<>();
    for (CloudPoint place : places) {
      double error = Bend.at(place);
      if (!Double.isNaN(error)) {
        judged.add(new Judged(place, error));
      }
    }
    judged.sort(Comparator.comparingDouble(Judged::error));
    int count = judged.size();
    if (count > 0) {
      add(clouds, model, "worst of " + count + " places", judged.get(count - 1));
    }
    if (count > 1) {
      add(clouds, model, "median of " + count + " places", judged.get((count - 1) / 2));
    }
  }

  private void add(ArrayNode clouds, String model, String which, Judged judged) {
    ObjectNode node = clouds.addObject();
    node.put("model", model);
    node.put("which", which);
    Numbers.put(node, "linearisationError", judged.error());
    new CloudNode(scenario, names).fill(node, judged.point(), methods);
  }
}

package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.Quantity;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.UpdateRecord;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.filters.model.SensorModel;
import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;

/** The updates of a run as JSON: normalised innovations squared, and innovations sensor by sensor. */
final class UpdatesNode {
  private final Scenario scenario;
  private final VariableNames names;
  private final Thinning thinning;
  private final Bounds bounds;

  UpdatesNode(Scenario scenario, VariableNames names, Thinning thinning, Bounds bounds) {
    this.scenario = scenario;
    this.names = names;
    this.thinning = thinning;
    this.bounds = bounds;
  }

  void fill(ObjectNode node, List<UpdateRecord> updates) {
    putSquares(node, updates);
    ArrayNode innovations = node.putArray("innovations");
    IdentityHashMap<SensorModel, List<UpdateRecord>> bySensor = new IdentityHashMap<>();
    List<SensorModel> sensors = new ArrayList<>();
    for (UpdateRecord update : updates) {
      if (!bySensor.containsKey(update.sensor())) {
        bySensor.put(update.sensor(), new ArrayList<>());
        sensors.add(update.sensor());
      }
      bySensor.get(update.sensor()).add(update);
    }
    for (SensorModel sensor : sensors) {
      String before = sensors.size() == 1 ? "" : nameOf(sensor, sensors.indexOf(sensor));
      putSensor(innovations, sensor, before, bySensor.get(sensor));
    }
  }

  private static String nameOf(SensorModel sensor, int index) {
    return "sensor " + (index + 1) + " " + sensor.getClass().getSimpleName() + ", ";
  }

  private double time(UpdateRecord update) {
    return scenario.steps().get(update.step()).time() - scenario.steps().get(0).time();
  }

  private void putSquares(ObjectNode node, List<UpdateRecord> updates) {
    node.put("count", updates.size());
    node.put("stride", thinning.stride(updates.size()));
    ArrayNode times = node.putArray("t");
    ArrayNode values = node.putArray("value");
    ArrayNode lower = node.putArray("lower");
    ArrayNode upper = node.putArray("upper");
    ArrayNode verdicts = node.putArray("verdict");
    thinning.of(updates.size()).mapToObj(updates::get).forEach(update -> {
      Numbers.addPlace(times, time(update));
      Numbers.add(values, update.normalisedSquared());
      Numbers.add(lower, bounds.of(update.degrees()).lower());
      Numbers.add(upper, bounds.of(update.degrees()).upper());
      verdicts.add(verdict(update).code());
    });
  }

  private Verdict verdict(UpdateRecord update) {
    return Verdict.of(update.status(), bounds.judge(update.normalisedSquared(), update.degrees()));
  }

  private void putSensor(
      ArrayNode innovations, SensorModel sensor, String before, List<UpdateRecord> updates) {
    List<Quantity> components = names.measurementOf(sensor.measurementSpace());
    for (int i = 0; i < components.size(); i++) {
      ObjectNode node = innovations.addObject();
      node.put("name", before + components.get(i).name());
      node.put("unit", components.get(i).unit());
      List<Single> singles = singles(updates, i, components.size());
      putSingles(node, singles);
      putWhiteness(node, singles);
    }
  }

  /** One component of one row. */
  private record Single(UpdateRecord update, int index) {
    double value() {
      return update.innovation(index);
    }

    double deviation() {
      return update.deviation(index);
    }
  }

  /** That component of all rows, those of stacked rows one after another. */
  private static List<Single> singles(List<UpdateRecord> updates, int component, int width) {
    List<Single> singles = new ArrayList<>();
    for (UpdateRecord update : updates) {
      for (int index = component; index < update.degrees(); index += width) {
        singles.add(new Single(update, index));
      }
    }
    return singles;
  }

  private void putSingles(ObjectNode node, List<Single> singles) {
    node.put("stride", thinning.stride(singles.size()));
    ArrayNode times = node.putArray("t");
    ArrayNode values = node.putArray("value");
    ArrayNode deviations = node.putArray("sd");
    ArrayNode verdicts = node.putArray("verdict");
    thinning.of(singles.size()).mapToObj(singles::get).forEach(single -> {
      Numbers.addPlace(times, time(single.update()));
      Numbers.add(values, single.value());
      Numbers.add(deviations, single.deviation());
      verdicts.add(Verdict.of(single.update().status(), Verdict.INSIDE).code());
    });
  }

  private static void putWhiteness(ObjectNode node, List<Single> singles) {
    double[] normalised = singles.stream()
        .filter(single -> single.update().status().isApplied())
        .mapToDouble(single -> single.value() / single.deviation())
        .toArray();
    Whiteness whiteness = new Whiteness(normalised);
    node.put("count", normalised.length);
    ArrayNode correlations = node.putArray("autocorrelation");
    for (int lag = 1; lag <= whiteness.lags(); lag++) {
      Numbers.add(correlations, whiteness.correlation(lag));
    }
    Numbers.put(node, "bound", whiteness.bound());
  }
}

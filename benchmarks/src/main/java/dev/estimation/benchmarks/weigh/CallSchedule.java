package dev.estimation.benchmarks.weigh;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.filters.model.SensorModel;
import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;

/**
 * What each call of a filter's matching belongs to: a prediction over time is one call, and so is each update. The
 * functions are the motion and each kind of sensor, in the order in which they are met. <i>Immutable.</i>
 */
final class CallSchedule {
  private static final int NOT_CHOSEN = -1;

  private final List<String> functions = new ArrayList<>();
  private final List<Integer> functionOfCall = new ArrayList<>();
  private final List<Boolean> selected = new ArrayList<>();
  private final List<Integer> functionOfPoint = new ArrayList<>();
  private final List<Integer> pointOfCall = new ArrayList<>();
  private final IdentityHashMap<SensorModel, Integer> sensors = new IdentityHashMap<>();
  private final List<Integer> firstCallOfRun = new ArrayList<>();
  private final int steps;

  CallSchedule(Region region) {
    this.steps = region.steps();
    functions.add(FunctionNames.of(region.runs().get(0).motion()));
    for (Scenario run : region.runs()) {
      firstCallOfRun.add(functionOfCall.size());
      addCalls(run.steps(), region.selection());
    }
    choosePoints(region.selection());
  }

  private void addCalls(List<Step> all, Selection selection) {
    for (int step = 0; step < all.size(); step++) {
      boolean chosen = selection.has(step);
      if (step > 0 && all.get(step).time() > all.get(step - 1).time()) {
        add(0, chosen);
      }
      for (Measurement measurement : all.get(step).measurements()) {
        add(functionOf(measurement.sensor()), chosen);
      }
    }
  }

  private void add(int function, boolean chosen) {
    functionOfCall.add(function);
    selected.add(chosen);
  }

  private int functionOf(SensorModel sensor) {
    return sensors.computeIfAbsent(sensor, first -> {
      functions.add(FunctionNames.unused(FunctionNames.of(first), functions));
      return functions.size() - 1;
    });
  }

  private void choosePoints(Selection selection) {
    int[] count = new int[functions.size()];
    int[] interval = new int[functions.size()];
    for (int f = 0; f < interval.length; f++) {
      interval[f] = selection.interval(calls(f));
    }
    for (int call = 0; call < functionOfCall.size(); call++) {
      int function = functionOfCall.get(call);
      boolean chosen = selected.get(call) && count[function]++ % interval[function] == 0;
      pointOfCall.add(chosen ? functionOfPoint.size() : NOT_CHOSEN);
      if (chosen) {
        functionOfPoint.add(function);
      }
    }
  }

  /** The calls of a function in the selected steps. */
  private int calls(int function) {
    int calls = 0;
    for (int call = 0; call < functionOfCall.size(); call++) {
      calls += selected.get(call) && functionOfCall.get(call) == function ? 1 : 0;
    }
    return calls;
  }

  /** The call with which a run begins. */
  int firstCallOfRun(int run) {
    return firstCallOfRun.get(run);
  }

  /** The names of the functions; the motion is the first. */
  List<String> functions() {
    return List.copyOf(functions);
  }

  /** How many calls of a function a selected step takes, the mean over them. */
  double callsPerStep(int function) {
    return calls(function) / (double) steps;
  }

  /** How many points were chosen. */
  int points() {
    return functionOfPoint.size();
  }

  /** The function of each chosen point. */
  int functionOfPoint(int point) {
    return functionOfPoint.get(point);
  }

  /** The chosen point that a call is, or a number below 0. */
  int pointOfCall(int call) {
    return pointOfCall.get(call);
  }
}

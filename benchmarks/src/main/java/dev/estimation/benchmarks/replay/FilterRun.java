package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.SensorModel;
import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Optional;

/** One pass over the steps of a scenario. */
final class FilterRun {
  private final Scenario scenario;
  private final FilterWorkspace workspace;
  private final IdentityHashMap<SensorModel, SensorPort> ports;
  private final Estimate estimate;
  private final Optional<AccuracyTally> accuracy;
  private final InnovationTally innovations = new InnovationTally();
  private final List<Snapshot> history = new ArrayList<>();
  private String failure = "";
  private long evaluations;
  private long jacobians;
  private long nanos;

  FilterRun(
      Scenario scenario,
      FilterPlan plan,
      FilterWorkspace workspace,
      IdentityHashMap<SensorModel, SensorPort> ports) {
    this.scenario = scenario;
    this.workspace = workspace;
    this.ports = ports;
    this.estimate = plan.start(scenario.startTime(), scenario.start());
    this.accuracy =
        scenario.truth().map(truth -> new AccuracyTally(scenario.motion().stateSpace(), truth));
  }

  RunResult complete() {
    for (Step step : scenario.steps()) {
      long begun = System.nanoTime();
      boolean done = predict(step) && update(step);
      nanos += System.nanoTime() - begun;
      if (!done) {
        break;
      }
      keep(step.time());
    }
    return new RunResult(
        status(),
        history,
        innovations.summary(),
        accuracy.map(AccuracyTally::summary).orElse(Accuracy.NONE),
        new Effort(evaluations, jacobians, nanos));
  }

  private boolean predict(Step step) {
    StepStatus status = workspace.predict(estimate, step.time());
    evaluations += workspace.evaluations();
    jacobians += workspace.jacobians();
    if (status != StepStatus.APPLIED) {
      failure = workspace.failure();
      return false;
    }
    return true;
  }

  private boolean update(Step step) {
    for (Measurement measurement : step.measurements()) {
      if (!update(measurement)) {
        return false;
      }
    }
    return true;
  }

  private boolean update(Measurement measurement) {
    SensorPort port = ports.get(measurement.sensor());
    StepStatus status = port.update(estimate, measurement.value(), measurement.given());
    evaluations += port.evaluations();
    jacobians += port.jacobians();
    if (status == StepStatus.APPLIED) {
      innovations.accept(port);
      return true;
    }
    if (status == StepStatus.GATED) {
      innovations.reject();
      return true;
    }
    failure = port.failure();
    return false;
  }

  private void keep(double time) {
    Snapshot snapshot = new Snapshot(history.size(), time, estimate.toGaussian());
    history.add(snapshot);
    accuracy.ifPresent(tally -> tally.add(time, snapshot.estimate()));
  }

  private String status() {
    if (failure.isEmpty()) {
      return RunResult.OK;
    }
    int step = history.size();
    return "step " + step + " at t = " + scenario.steps().get(step).time() + " s failed: "
        + failure;
  }
}

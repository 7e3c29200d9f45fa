package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * One pass over the steps of a scenario. A row that the gate rejects is skipped; so is one whose
 * iterated update does not settle, which the status tells. Any other failure ends the run.
 */
final class FilterRun {
  private final Scenario scenario;
  private final FilterWorkspace workspace;
  private final MeasurementPorts ports;
  private final Estimate estimate;
  private final Optional<TrackSmoother> smoother;
  private final RunFollower follower;
  private final Optional<AccuracyTally> accuracy;
  private final InnovationTally innovations = new InnovationTally();
  private final SkippedUpdates skipped = new SkippedUpdates();
  private final List<Snapshot> history = new ArrayList<>();
  private String failure = "";
  private long evaluations;
  private long jacobians;
  private long nanos;
  private boolean belowTolerance;
  private int stepsBelowTolerance;

  FilterRun(
      Scenario scenario,
      FilterWorkspace workspace,
      MeasurementPorts ports,
      Estimate start,
      Optional<TrackSmoother> smoother,
      RunFollower follower) {
    this.scenario = scenario;
    this.workspace = workspace;
    this.ports = ports;
    this.estimate = start;
    this.smoother = smoother;
    this.follower = follower;
    this.accuracy = scenario.accuracy();
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
        Optional.of(innovations.summary()),
        accuracy.map(AccuracyTally::summary).orElse(Accuracy.NONE),
        new Effort(evaluations, jacobians, nanos),
        stepsBelowTolerance);
  }

  private boolean predict(Step step) {
    follower.predicting(history.size(), step, estimate);
    StepStatus status = workspace.predict(estimate, step.time(), step.sharedControl());
    follower.predicted(history.size(), step, status, workspace);
    evaluations += workspace.evaluations();
    jacobians += workspace.jacobians();
    belowTolerance = status == StepStatus.APPLIED_BELOW_TOLERANCE;
    if (!status.isApplied()) {
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

  /** Updates with a row, or skips it; false if the run cannot go on. */
  private boolean update(Measurement measurement) {
    MeasurementPort port = ports.of(measurement);
    follower.updating(history.size(), measurement, estimate);
    StepStatus status = port.update(estimate, measurement);
    SensorPort told = port.last();
    follower.updated(history.size(), measurement, status, told);
    belowTolerance |= status == StepStatus.APPLIED_BELOW_TOLERANCE;
    evaluations += told.evaluations();
    jacobians += told.jacobians();
    switch (status) {
      case APPLIED, APPLIED_BELOW_TOLERANCE -> innovations.accept(told);
      case GATED -> innovations.reject();
      case NOT_CONVERGED -> {
        innovations.skip();
        skipped.add(history.size(), estimate.time());
      }
      default -> {
        failure = told.failure();
        return false;
      }
    }
    return true;
  }

  private void keep(double time) {
    Snapshot snapshot = new Snapshot(history.size(), time, estimate.toGaussian());
    history.add(snapshot);
    accuracy.ifPresent(tally -> tally.add(time, snapshot.estimate()));
    smoother.ifPresent(behind -> behind.record(workspace, estimate));
    stepsBelowTolerance += belowTolerance ? 1 : 0;
    follower.done(snapshot);
  }

  private String status() {
    String unsettled = skipped.summary();
    if (failure.isEmpty()) {
      return unsettled.isEmpty() ? RunResult.OK : unsettled;
    }
    int step = history.size();
    String failed =
        "step " + step + " at t = " + scenario.steps().get(step).time() + " s failed: " + failure;
    return unsettled.isEmpty() ? failed : failed + "; " + unsettled;
  }
}

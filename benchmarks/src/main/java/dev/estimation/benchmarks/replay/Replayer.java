package dev.estimation.benchmarks.replay;

import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import java.util.Optional;

/**
 * Runs one scenario with one kind of filter. Everything that the filter needs is made beforehand,
 * so that a filter which cannot serve the models is refused before anything runs, and steps
 * allocate nothing. <i>Confined to one thread</i>; may run more than once.
 */
public final class Replayer {
  private final Scenario scenario;
  private final FilterPlan plan;
  private final FilterWorkspace workspace;
  private final MeasurementPorts ports;

  /**
   * Prepares a run with the filter of a matching.
   *
   * @throws IllegalArgumentException if the matching cannot serve a model of the scenario
   */
  public Replayer(Scenario scenario, MomentMatching matching) {
    this(scenario, FilterKind.of(matching));
  }

  /**
   * Prepares a run.
   *
   * @throws IllegalArgumentException if the filter cannot serve a model of the scenario
   */
  public Replayer(Scenario scenario, FilterKind kind) {
    this.scenario = scenario;
    this.plan = scenario.plan(kind);
    this.workspace = plan.workspace();
    this.ports = new MeasurementPorts(workspace, scenario.steps());
  }

  /** Runs all steps, up to the first that fails. */
  public RunResult run() {
    return run(RunFollower.NONE);
  }

  /** Runs all steps, up to the first that fails, and tells a follower about them. */
  public RunResult run(RunFollower follower) {
    return run(start(), Optional.empty(), follower);
  }

  /** Runs all steps, up to the first that fails, and then smooths what was done. */
  public FilteredAndSmoothed runAndSmooth() {
    return runAndSmooth(RunFollower.NONE);
  }

  /** Runs and smooths, and tells a follower about the run. */
  public FilteredAndSmoothed runAndSmooth(RunFollower follower) {
    Estimate start = start();
    TrackSmoother smoother = new TrackSmoother(scenario, start);
    RunResult filtered = run(start, Optional.of(smoother), follower);
    return new FilteredAndSmoothed(filtered, smoother.smooth(filtered));
  }

  private Estimate start() {
    return plan.start(scenario.startTime(), scenario.start());
  }

  private RunResult run(Estimate start, Optional<TrackSmoother> smoother, RunFollower follower) {
    return new FilterRun(scenario, workspace, ports, start, smoother, follower).complete();
  }
}

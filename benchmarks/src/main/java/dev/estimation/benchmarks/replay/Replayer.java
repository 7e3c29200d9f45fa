package dev.estimation.benchmarks.replay;

import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.model.SensorModel;
import java.util.IdentityHashMap;

/**
 * Runs one scenario with one way of carrying moments. Everything that the filter needs is made
 * beforehand, so that a matching which cannot serve the models is refused before anything runs, and
 * steps allocate nothing. <i>Confined to one thread</i>; may run more than once.
 */
public final class Replayer {
  private final Scenario scenario;
  private final FilterPlan plan;
  private final FilterWorkspace workspace;
  private final IdentityHashMap<SensorModel, SensorPort> ports = new IdentityHashMap<>();

  /**
   * Prepares a run.
   *
   * @throws IllegalArgumentException if the matching cannot serve a model of the scenario
   */
  public Replayer(Scenario scenario, MomentMatching matching) {
    this.scenario = scenario;
    this.plan = scenario.plan(matching);
    this.workspace = plan.workspace();
    for (Step step : scenario.steps()) {
      for (Measurement measurement : step.measurements()) {
        ports.computeIfAbsent(measurement.sensor(), workspace::port);
      }
    }
  }

  /** Runs all steps, up to the first that fails. */
  public RunResult run() {
    FilterRun run = new FilterRun(scenario, plan, workspace, ports);
    return run.complete();
  }
}

package dev.estimation.benchmarks.page;

import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.RunResult;

/**
 * A method whose moments are shown over a cloud.
 *
 * @param name of the method
 * @param kind the kind of filter
 * @param evaluations of its run; 0 if that did not come to its end, so that it is not gone by
 */
record CloudMethod(String name, FilterKind kind, long evaluations) {
  static CloudMethod of(PageRun run) {
    RunResult result = run.result().orElseThrow();
    boolean whole = result.status().equals(RunResult.OK);
    return new CloudMethod(run.name(), run.kind(), whole ? result.effort().evaluations() : 0);
  }
}

package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.RunResult;
import java.util.Optional;

/**
 * A run and what it was a run of.
 *
 * @param variant of which log
 * @param method as typed
 * @param wholeState whether points were drawn over the whole state
 * @param result empty if the log does not have the variant
 */
record LabelledRun(
    LoadedVariant variant, String method, boolean wholeState, Optional<RunResult> result) {
  /** {@return how the run ended, in one line} */
  String status() {
    String status = result.map(RunResult::status).orElse(variant.absence());
    return status.replaceAll("\\s+", " ");
  }
}

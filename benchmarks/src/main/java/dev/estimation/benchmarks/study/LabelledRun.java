package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.RunTrace;
import java.util.Optional;

/**
 * A run and what it was a run of.
 *
 * @param variant of which log
 * @param method as typed
 * @param wholeState whether points were drawn over the whole state
 * @param squareRoot whether the filter worked in square-root form
 * @param smoothed whether the track was smoothed
 * @param kind the kind of filter that ran
 * @param result empty if the log does not have the variant
 * @param trace what each update told; empty for a smoothed run and where there is no result
 */
record LabelledRun(
    LoadedVariant variant,
    String method,
    boolean wholeState,
    boolean squareRoot,
    boolean smoothed,
    FilterKind kind,
    Optional<RunResult> result,
    Optional<RunTrace> trace) {
  private static final String SQUARE_ROOT = " square-root";
  private static final String SMOOTHED = " smoothed";

  /** {@return how the run ended, in one line} */
  String status() {
    String status = result.map(RunResult::status).orElse(variant.absence());
    return status.replaceAll("\\s+", " ");
  }

  /** {@return the method, and that it was in square-root form or smoothed if it was} */
  String name() {
    return method + (squareRoot ? SQUARE_ROOT : "") + (smoothed ? SMOOTHED : "");
  }

  /** {@return the longest name that a run of these methods can have} */
  static int longestName(Iterable<Method> methods, boolean squareRoot) {
    int longest = 0;
    for (Method method : methods) {
      longest = Math.max(longest, method.typed().length());
    }
    return longest + (squareRoot ? SQUARE_ROOT.length() : 0) + SMOOTHED.length();
  }
}

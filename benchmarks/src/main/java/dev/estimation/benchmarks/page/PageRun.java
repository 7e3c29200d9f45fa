package dev.estimation.benchmarks.page;

import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.RunTrace;
import java.util.Optional;

/**
 * A run as the page shows it.
 *
 * @param name of the method
 * @param kind the kind of filter that ran
 * @param smoothed whether it is the smoothed track of a run
 * @param status how it ended, in one line
 * @param result empty if the log does not have the variant
 * @param trace what each update told; empty for a smoothed run
 */
public record PageRun(
    String name,
    FilterKind kind,
    boolean smoothed,
    String status,
    Optional<RunResult> result,
    Optional<RunTrace> trace) {}

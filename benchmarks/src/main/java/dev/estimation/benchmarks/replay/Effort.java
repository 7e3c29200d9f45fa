package dev.estimation.benchmarks.replay;

/**
 * What a run cost.
 *
 * @param evaluations of motion and sensor models
 * @param jacobians formed
 * @param nanos wall time spent in predictions and updates, one pass, no warm-up
 */
public record Effort(long evaluations, long jacobians, long nanos) {}

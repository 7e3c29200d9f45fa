package dev.estimation.benchmarks.replay;

/**
 * Two runs of one scenario with one kind of filter.
 *
 * @param filtered each step knows the measurements up to its own
 * @param smoothed each step knows all measurements
 */
public record FilteredAndSmoothed(RunResult filtered, RunResult smoothed) {}

package dev.estimation.benchmarks.replay;

/**
 * How large the errors of one kind were, over the steps that have truth.
 *
 * @param rmse root of the mean squared error; NaN if there are no such steps
 * @param max largest error; NaN if there are no such steps
 */
public record Score(double rmse, double max) {}

package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Gaussian;

/**
 * The estimate after all measurements of a step.
 *
 * @param step counted from 0
 * @param time s
 * @param estimate mean and covariance
 */
public record Snapshot(int step, double time, Gaussian estimate) {}

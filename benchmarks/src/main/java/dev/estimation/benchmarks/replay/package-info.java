/**
 * Running a filter over recorded or simulated steps and keeping what came out. A {@link
 * dev.estimation.benchmarks.replay.ReplayCase} makes {@link
 * dev.estimation.benchmarks.replay.Scenario}s; a {@link dev.estimation.benchmarks.replay.Replayer}
 * runs one with one kind of filter.
 */
package dev.estimation.benchmarks.replay;

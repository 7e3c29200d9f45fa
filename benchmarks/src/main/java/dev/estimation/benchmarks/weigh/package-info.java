/**
 * Which way of carrying moments suffices for a motion and its sensors, at the operating points of a run. A run by a trusted
 * matching is tapped: each call of the matching is an operating point, exactly as a filter meets it. There a
 * {@link dev.estimation.core.accuracy.ReferenceSearch} finds the truth, and every contender is held against it.
 */
package dev.estimation.benchmarks.weigh;

/**
 * JMH benchmarks. {@code KernelBenchmark} says which small kernels the library keeps as its own;
 * {@code StepBenchmark} what a filter step costs with each method; {@code SideBySide} sets it beside
 * a native program in one run.
 */
package dev.estimation.benchmarks.jmh;

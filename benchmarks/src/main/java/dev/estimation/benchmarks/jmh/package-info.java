/**
 * JMH benchmarks. {@code KernelBenchmark} says which small kernels the library keeps as its own;
 * {@code StepBenchmark} what a filter step costs with each method; {@code SideBySide} sets it beside
 * a native program in one run; {@code SmootherBenchmark} what a step of the smoother costs; {@code MatchingBenchmark} what
 * a call of each matching costs with each function, {@code ScalingBenchmark} how that grows with the dimension; {@code
 * CostTable} sets costs beside errors.
 */
package dev.estimation.benchmarks.jmh;

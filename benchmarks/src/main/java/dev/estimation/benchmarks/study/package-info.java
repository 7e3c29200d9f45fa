/** The study program: commands, and the ways in which their results are shown and kept. */
package dev.estimation.benchmarks.study;

/** A simulated weather balloon followed from the ground: the built-in demonstration. */
package dev.estimation.benchmarks.cases.balloon;

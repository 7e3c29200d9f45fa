/** A receiver at rest, placed by pseudoranges to satellites. */
package dev.estimation.benchmarks.cases.gnss;

/** A vessel tracked by the radar of another vessel. */
package dev.estimation.benchmarks.cases.vessel;

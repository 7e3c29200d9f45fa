/** A tag in the plane, placed by ultra-wideband ranges to fixed anchors. */
package dev.estimation.benchmarks.cases.uwb;

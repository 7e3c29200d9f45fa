/**
 * Checks of a motion or sensor model of one's own, for a unit test under any test library: {@link
 * dev.estimation.filters.modelcheck.ModelCheck} examines a model over a {@link
 * dev.estimation.filters.modelcheck.Region} and reports what is wrong with it, where, and with which numbers.
 *
 * <p>The kinds of findings, each with its criterion, are those of {@link
 * dev.estimation.filters.modelcheck.FindingKind}. Faults are errors; hints are worth a look. All thresholds are relative
 * to what the model itself puts out over the region, so units do not matter. A clean report says that nothing was
 * found at the places looked at, not that a model is true: no check knows what the sensor really does.
 *
 * <p>Plans and results are immutable. Unlike the rest of the library a check allocates; it is no part of a step.
 */
package dev.estimation.filters.modelcheck;

/**
 * Estimates that use later measurements too. A {@link
 * dev.estimation.filters.smoother.FixedIntervalSmoother} records a filter's steps, whatever its
 * matching, and then goes back over them. Recording allocates: its memory grows with the steps.
 */
package dev.estimation.filters.smoother;

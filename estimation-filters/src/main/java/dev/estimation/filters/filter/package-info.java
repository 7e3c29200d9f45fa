/**
 * The Gaussian filter on any matching: extended, unscented, cubature and Gauss-Hermite filters are its
 * configurations.
 *
 * <p>A {@link dev.estimation.filters.filter.FilterPlan} is immutable and shared by all threads. A
 * {@link dev.estimation.filters.filter.FilterWorkspace} and its {@link
 * dev.estimation.filters.filter.SensorPort}s belong to one thread and own all scratch. An {@link
 * dev.estimation.filters.filter.Estimate} is the state of one track. A step either happens or it does
 * not: on any status but {@code APPLIED}, and on any exception, the estimate is unchanged bit for bit.
 * No step allocates.
 */
package dev.estimation.filters.filter;

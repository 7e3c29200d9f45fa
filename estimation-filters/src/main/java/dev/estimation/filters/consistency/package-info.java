/**
 * Whether covariances are honest: normalised errors (against truth) and normalised innovations should
 * follow chi-square distributions, and stay inside {@link
 * dev.estimation.filters.consistency.ChiSquareBounds} as often as those say.
 *
 * <p>Too large on average: the filter claims more than it knows. Too small: it knows more than it
 * claims.
 */
package dev.estimation.filters.consistency;

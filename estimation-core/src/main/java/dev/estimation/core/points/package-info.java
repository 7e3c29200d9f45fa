/**
 * Point rules: sets of points and weights that stand for the standard normal distribution N(0, I).
 * Unscented, cubature and Gauss-Hermite differ in nothing else; {@code PointMatching} serves them
 * all. Rules and their points are immutable and are made once, when a workspace is.
 */
package dev.estimation.core.points;

/**
 * What is known of a vector: {@link dev.estimation.core.gaussian.Gaussian}, the immutable and
 * validated value at the edge of the library, and {@link dev.estimation.core.gaussian.Moments}, one
 * thread's mutable mean and covariance on the step path, which allocates nothing after it is built. Off the
 * step path: {@link dev.estimation.core.gaussian.Fusion} of independent estimates, {@link
 * dev.estimation.core.gaussian.CovarianceIntersection} of those that may be correlated, and {@link
 * dev.estimation.core.gaussian.Divergence}, how far two are apart.
 */
package dev.estimation.core.gaussian;

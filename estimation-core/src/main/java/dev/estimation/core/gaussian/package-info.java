/**
 * What is known of a vector: {@link dev.estimation.core.gaussian.Gaussian}, the immutable and
 * validated value at the edge of the library, and {@link dev.estimation.core.gaussian.Moments}, one
 * thread's mutable mean and covariance on the step path, which allocates nothing after it is built.
 */
package dev.estimation.core.gaussian;

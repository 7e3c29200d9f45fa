package dev.estimation.core.gaussian;

/** How covariances are carried from step to step. */
public enum Form {
  /**
   * The covariance itself: sums of squares, then a Cholesky factor. The cheaper form; where standard deviations of
   * some directions are below 1e-8 of others, rounding decides: the smaller pass for zero, or a status says that
   * the covariance is not positive semi-definite.
   */
  COVARIANCE,
  /**
   * A lower factor of it, found by orthogonal reduction and never squared: twice the digits for hard
   * conditioning. Points with negative weights need downdates, which may fail and then say so. Source:
   * van der Merwe and Wan 2001, <i>The square-root unscented Kalman filter for state and
   * parameter-estimation</i>; Bierman 1977, <i>Factorization Methods for Discrete Sequential
   * Estimation</i> (from memory).
   */
  SQUARE_ROOT
}

package dev.estimation.core.gaussian;

/** How covariances are carried from step to step. */
public enum Form {
  /**
   * The covariance itself: sums of squares, then a Cholesky factor. The cheaper form; directions whose
   * standard deviations differ by more than 1e7 or so are lost to rounding, which is told by a status.
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

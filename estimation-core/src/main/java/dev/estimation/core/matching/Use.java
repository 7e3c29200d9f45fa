package dev.estimation.core.matching;

/** What a result is used for; so nothing is made that its user does not want. */
public enum Use {
  /** The moments of the output are the next estimate. */
  PREDICTION,
  /**
   * The input is corrected by an observed output: the mean, the cross-covariance and what regression leaves
   * are wanted. The output's covariance is made when it is asked for.
   */
  UPDATE
}

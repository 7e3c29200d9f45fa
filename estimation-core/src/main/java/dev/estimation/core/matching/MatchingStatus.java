package dev.estimation.core.matching;

/** How a call of {@link MatchingWorkspace#carry} ended. */
public enum MatchingStatus {
  /** The moments of the output are there. */
  MATCHED,
  /** The mean of the input is NaN or infinite. Usual cause: an earlier failure that was ignored. */
  INPUT_NOT_FINITE,
  /** The additive noise has NaN or infinity. Usual cause: a fault in a noise model. */
  NOISE_NOT_FINITE,
  /** The additive noise is not positive semi-definite; asked in square-root form only. */
  NOISE_NOT_DEFINITE,
  /**
   * The covariance of the input is not positive semi-definite, or not finite. Usual causes: rounding
   * after many updates of very different accuracy, a covariance set by hand.
   */
  INPUT_NOT_DEFINITE,
  /**
   * The function gave NaN or infinity, or left a component out. Usual causes: a point outside its
   * domain (try a smaller spread), too few outputs filled.
   */
  FUNCTION_NOT_FINITE,
  /** The function wrote on its input; found out at the mean. Usual cause: a fault in the plug-in. */
  FUNCTION_CHANGED_INPUT,
  /** The Jacobian or the Hessian has NaN or infinity. Usual causes: a singular point such as zero range. */
  JACOBIAN_NOT_FINITE,
  /** The moments of the output overflow. Usual cause: a variance far outside the model's units. */
  OUTPUT_NOT_FINITE,
  /** The output has no factor: negative weights left nothing to take a root of. Square-root form only. */
  OUTPUT_NOT_DEFINITE,
  /**
   * The moments are there, but their estimated error is above the tolerance, or could not be confirmed: the budget of
   * evaluations has ended, an angle would pass half a turn, or values further out are not finite. {@link
   * MatchingWorkspace#estimatedError()} tells the error. Only {@link ToleranceMatching} ends so.
   */
  BELOW_TOLERANCE;

  /** {@return whether there are moments of the output} */
  public boolean hasResult() {
    return this == MATCHED || this == BELOW_TOLERANCE;
  }
}

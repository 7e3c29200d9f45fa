package dev.estimation.filters.filter;

import dev.estimation.core.matching.MatchingStatus;

/** How a step ended. Only {@link #APPLIED} and {@link #APPLIED_BELOW_TOLERANCE} change the estimate. */
public enum StepStatus {
  /** The estimate has changed (or the prediction was over no time). */
  APPLIED,
  /**
   * The estimate has changed, but the moments behind the step are not within the tolerance that was asked for. Only with
   * {@code ToleranceMatching}; a plan may refuse such steps.
   */
  APPLIED_BELOW_TOLERANCE,
  /**
   * The moments behind the step are not within the tolerance that was asked for, and the plan refuses such steps. Usual
   * causes: a function that is not smooth at the scale of the spread, a budget too small for the number of inputs.
   */
  BELOW_TOLERANCE,
  /** The gate rejected the measurement. Usual causes: an outlier, an overconfident estimate. */
  GATED,
  /** The time of the step lies before the estimate. Usual cause: late data. */
  TIME_BEFORE_ESTIMATE,
  /** The time of the step is NaN or infinite. */
  TIME_NOT_FINITE,
  /**
   * A measurement, a given or a control is NaN or infinite, or a measured quaternion is none. Usual
   * cause: bad input.
   */
  INPUT_NOT_FINITE,
  /** The model gave NaN or infinity, or left a component out. Usual cause: a fault in the plug-in. */
  MODEL_NOT_FINITE,
  /** The model wrote on the state that it is given to read. Usual cause: a fault in the plug-in. */
  MODEL_CHANGED_INPUT,
  /** Process or measurement noise is not a covariance. Usual cause: a fault in the plug-in. */
  NOISE_NOT_VALID,
  /**
   * The covariance of the innovation is not positive definite, or that of the result not positive
   * semi-definite. Usual causes: negative weights, measurements far more accurate than the estimate.
   */
  NOT_DEFINITE,
  /**
   * An iterated update did not settle within its rounds. Usual causes: a measurement that bends within
   * the spread of the prior (try a line search), a prior that is too wide.
   */
  NOT_CONVERGED,
  /** The result overflows. Usual causes: an innovation or a variance of absurd size. */
  RESULT_NOT_FINITE;

  /** {@return whether the estimate has changed, or the prediction was over no time} */
  public boolean isApplied() {
    return this == APPLIED || this == APPLIED_BELOW_TOLERANCE;
  }

  static StepStatus of(MatchingStatus matched) {
    return switch (matched) {
      case MATCHED -> APPLIED;
      case BELOW_TOLERANCE -> APPLIED_BELOW_TOLERANCE;
      case FUNCTION_NOT_FINITE, JACOBIAN_NOT_FINITE -> MODEL_NOT_FINITE;
      case FUNCTION_CHANGED_INPUT -> MODEL_CHANGED_INPUT;
      case INPUT_NOT_DEFINITE, OUTPUT_NOT_DEFINITE -> NOT_DEFINITE;
      case NOISE_NOT_FINITE, NOISE_NOT_DEFINITE -> NOISE_NOT_VALID;
      case INPUT_NOT_FINITE, OUTPUT_NOT_FINITE -> RESULT_NOT_FINITE;
    };
  }
}

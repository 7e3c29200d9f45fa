package dev.estimation.filters.modelcheck;

/**
 * What can be wrong with a model, and when it is said to be. M is the largest magnitude of an output over the region, S the
 * largest change that moving one input within the region makes to it. r is its rounding between two places: what is left
 * of second differences over 2^-26 to 2^-29 of the way, or what rounding of the inputs does, if that is more.
 */
public enum FindingKind {
  /** A method of the model threw, at a place inside the region; or its structure names impossible inputs. */
  EXCEPTION(true),
  /** A method wrote on the state, noise, control or given that it may only read. */
  INPUT_CHANGED(true),
  /** A vector's component was not written, or was read before it was. Vectors arrive filled with NaN. */
  OUTPUT_UNFILLED(true),
  /** An output is NaN or infinite. */
  NOT_FINITE(true),
  /** Two equal calls, one right after the other, gave different bits. */
  NOT_DETERMINISTIC(true),
  /**
   * A call at another place, of this method or another, changes the bits of the next result, or a later call changes
   * the arrays of an earlier one: the model keeps an array, or a value that it takes for current.
   */
  EARLIER_CALL(true),
  /** The model that a motion gives for one thread is not the same motion, bit for bit. */
  THREAD_COPY(true),
  /** A method allocates: 8 bytes a call or more in every one of several windows of calls. */
  ALLOCATION(true),
  /**
   * An entry of the Jacobian disagrees with differences by the criterion of {@link
   * dev.estimation.core.function.JacobianCheck}, and also, by more than 1e-6 and ten times their scatter, with the most
   * certain ones over steps of 1/16 to 2^-22 of the half-width, which see rounding inside a model.
   */
  JACOBIAN(true),
  /** An entry of the Hessian disagrees with differences of the Jacobian, likewise. */
  HESSIAN(true),
  /** An input that is not declared active changes an output by more than 1e-10 (M + S). */
  UNDECLARED_INPUT(true),
  /** An active input changes no bit of any output: declaring the others saves evaluations. A hint. */
  UNREAD_INPUT(false),
  /**
   * The function is not linear in what it declares linear: between two places that differ in these inputs alone, the middle
   * is off the middle of the outputs by more than 1e-9 of their difference, 100 r and 64 roundings of the output.
   */
  NOT_LINEAR(true),
  /**
   * An output jumps by 2 pi between inputs that differ by rounding, in a component that its space does not call an
   * angle.
   */
  UNDECLARED_SEAM(true),
  /**
   * The state's angle a and a +- 2 pi give different outputs, and so do -pi and the last number before pi: more than 1e-6 S
   * and 1e-9 M.
   */
  ANGLE_NOT_PERIODIC(true),
  /** A noise covariance is not symmetric, by the rule that filters apply. */
  NOISE_NOT_SYMMETRIC(true),
  /** A process noise is not positive semi-definite, a measurement noise not positive definite, likewise. */
  NOISE_NOT_DEFINITE(true),
  /**
   * F Q(h) F' + Q(h) is not Q(2 h), by more than 1e-6 of sqrt(Q_ii Q_jj), in a motion that is linear, composes itself, and
   * has a noise independent of the state: the covariance then depends on how time is cut. Looked for where
   * the region's longest step is twice its shortest or more: with one step alone nobody can tell.
   */
  NOISE_NOT_COMPOSING(true),
  /** A standard deviation above 0 is less than half the spacing of doubles at the output. A hint. */
  NOISE_BELOW_ROUNDING(false),
  /**
   * Moving an input through the region changes every output less than a 1e-8th (or what was set) of what another input
   * does: widths or units may be wrong. A hint.
   */
  UNEQUAL_SCALES(false);

  private final boolean fault;

  FindingKind(boolean fault) {
    this.fault = fault;
  }

  /** {@return whether this is an error; otherwise it is a hint} */
  public boolean isFault() {
    return fault;
  }
}

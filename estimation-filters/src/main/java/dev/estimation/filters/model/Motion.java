package dev.estimation.filters.model;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;

/**
 * What all motion models have, whichever way their noise enters: added afterwards ({@link
 * MotionModel}), or inside the motion ({@link NoiseDrivenMotion}).
 *
 * <p>Units are SI and radians. Implementations are called by many threads at once and must not keep
 * state that changes.
 */
public sealed interface Motion permits MotionModel, NoiseDrivenMotion {
  /** {@return where the state lives} */
  Space stateSpace();

  /** {@return the number of controls that the motion reads; 0 if there are none} */
  default int controlDimension() {
    return 0;
  }

  /** {@return the inputs that the motion reads, and is linear in; all and none unless said otherwise} */
  default Structure structure() {
    return Structure.UNKNOWN;
  }

  /**
   * This model for the use of one thread, so that it may keep scratch and need not allocate at each call; the same
   * motion and the same interfaces. A workspace asks for it when it is made and keeps it to itself; whoever else asks must not
   * share it between threads. Itself unless said otherwise, which is right for a model without scratch.
   *
   * @return the model for one thread
   */
  default Motion forOneThread() {
    return this;
  }
}

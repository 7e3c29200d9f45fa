package dev.estimation.filters.motion;

import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.NoiseDrivenMotion;
import java.util.List;

/**
 * Several motions that know nothing of each other, as one motion of one state: {@code MotionBlocks.of(new
 * ConstantVelocity(q, q, q), new ReceiverClock(p, f))} has the state of the first, then that of the second, and so have its
 * control and its noise.
 *
 * <p>F and Q are block diagonal. What is known of the blocks is known of the whole: spaces, active and linear inputs;
 * a Jacobian, and a Hessian, if every block has one. Noise is added in all blocks, or enters inside in all: a {@link
 * NoiseDrivenMotion} has no place for added noise that depends on the state.
 *
 * <p>The results are <i>immutable</i>. A filter's workspace takes its own copy with scratch ({@link
 * MotionModel#forOneThread}) and allocates nothing in a step if the blocks do not; whoever calls the shared model itself
 * allocates some short arrays at each call. Blocks are given copies of their parts of state, control and noise.
 */
public final class MotionBlocks {
  private MotionBlocks() {}

  /**
   * Blocks to which noise is added.
   *
   * @param blocks one or more, in the order of the state
   * @return a {@code DifferentiableMotion} if all blocks are, a {@code TwiceDifferentiableMotion} if all are
   */
  public static MotionModel of(MotionModel... blocks) {
    return AdditiveBlocks.of(List.of(blocks), false);
  }

  /**
   * Blocks in which noise enters inside.
   *
   * @param blocks one or more, in the order of the state
   * @return a {@code DifferentiableNoiseDrivenMotion} if all blocks are
   */
  public static NoiseDrivenMotion of(NoiseDrivenMotion... blocks) {
    return NoiseDrivenBlocks.of(List.of(blocks), false);
  }
}

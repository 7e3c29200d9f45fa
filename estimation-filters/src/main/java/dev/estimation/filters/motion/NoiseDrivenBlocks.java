package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.NoiseDrivenMotion;
import java.util.List;

/** Blocks in which noise enters inside; see {@link MotionBlocks}. */
class NoiseDrivenBlocks implements NoiseDrivenMotion {
  final List<? extends NoiseDrivenMotion> blocks;
  final BlockLayout layout;

  private NoiseDrivenBlocks(List<? extends NoiseDrivenMotion> blocks, boolean forOneThread) {
    this.blocks = blocks;
    this.layout = new BlockLayout(blocks, forOneThread);
  }

  static NoiseDrivenBlocks of(List<? extends NoiseDrivenMotion> blocks, boolean forOneThread) {
    return blocks.stream().allMatch(DifferentiableNoiseDrivenMotion.class::isInstance)
        ? new DifferentiableNoiseDrivenBlocks(blocks, forOneThread)
        : new NoiseDrivenBlocks(blocks, forOneThread);
  }

  @Override
  public NoiseDrivenMotion forOneThread() {
    return of(
        blocks.stream().map(block -> (NoiseDrivenMotion) block.forOneThread()).toList(), true);
  }

  @Override
  public Space stateSpace() {
    return layout.space();
  }

  @Override
  public int controlDimension() {
    return layout.controls();
  }

  @Override
  public int noiseDimension() {
    return layout.noises();
  }

  @Override
  public Structure structure() {
    return layout.structure();
  }

  @Override
  public void move(
      double[] state, double[] noise, double[] control, double time, double dt, double[] next) {
    List<BlockScratch> scratch = layout.scratch();
    for (int k = 0; k < blocks.size(); k++) {
      BlockScratch own = scratch.get(k);
      blocks
          .get(k)
          .move(own.state(state), own.noise(noise), own.control(control), time, dt, own.next());
      own.putNext(next);
    }
  }

  @Override
  public void noiseCovariance(double[] control, double time, double dt, double[] covariance) {
    List<BlockScratch> scratch = layout.scratch();
    for (int k = 0; k < blocks.size(); k++) {
      BlockScratch own = scratch.get(k);
      blocks.get(k).noiseCovariance(own.control(control), time, dt, own.noiseSquare());
      own.putNoiseSquare(covariance, layout.noises());
    }
  }

  /** Blocks that all know their Jacobians. */
  private static final class DifferentiableNoiseDrivenBlocks extends NoiseDrivenBlocks
      implements DifferentiableNoiseDrivenMotion {
    DifferentiableNoiseDrivenBlocks(
        List<? extends NoiseDrivenMotion> blocks, boolean forOneThread) {
      super(blocks, forOneThread);
    }

    @Override
    public void moveJacobians(
        double[] state,
        double[] noise,
        double[] control,
        double time,
        double dt,
        double[] byState,
        double[] byNoise) {
      List<BlockScratch> scratch = layout.scratch();
      for (int k = 0; k < blocks.size(); k++) {
        BlockScratch own = scratch.get(k);
        ((DifferentiableNoiseDrivenMotion) blocks.get(k))
            .moveJacobians(
                own.state(state),
                own.noise(noise),
                own.control(control),
                time,
                dt,
                own.square(),
                own.byNoise());
        own.putSquare(byState, layout.dimension());
        own.putByNoise(byNoise, layout.noises());
      }
    }
  }
}

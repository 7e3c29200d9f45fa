package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import java.util.List;

/** Blocks to which noise is added; see {@link MotionBlocks}. */
class AdditiveBlocks implements MotionModel {
  final List<? extends MotionModel> blocks;
  final BlockLayout layout;

  private AdditiveBlocks(List<? extends MotionModel> blocks, boolean forOneThread) {
    this.blocks = blocks;
    this.layout = new BlockLayout(blocks, forOneThread);
  }

  static AdditiveBlocks of(List<? extends MotionModel> blocks, boolean forOneThread) {
    if (blocks.stream().allMatch(TwiceDifferentiableMotion.class::isInstance)) {
      return new TwiceDifferentiableBlocks(blocks, forOneThread);
    }
    return blocks.stream().allMatch(DifferentiableMotion.class::isInstance)
        ? new DifferentiableBlocks(blocks, forOneThread)
        : new AdditiveBlocks(blocks, forOneThread);
  }

  @Override
  public MotionModel forOneThread() {
    return of(blocks.stream().map(block -> (MotionModel) block.forOneThread()).toList(), true);
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
  public Structure structure() {
    return layout.structure();
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    List<BlockScratch> scratch = layout.scratch();
    for (int k = 0; k < blocks.size(); k++) {
      BlockScratch own = scratch.get(k);
      blocks.get(k).move(own.state(state), own.control(control), time, dt, own.next());
      own.putNext(next);
    }
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    List<BlockScratch> scratch = layout.scratch();
    for (int k = 0; k < blocks.size(); k++) {
      BlockScratch own = scratch.get(k);
      blocks.get(k).processNoise(own.state(state), own.control(control), time, dt, own.square());
      own.putSquare(covariance, layout.dimension());
    }
  }

  /** Blocks that all know their Jacobians. */
  private static class DifferentiableBlocks extends AdditiveBlocks implements DifferentiableMotion {
    DifferentiableBlocks(List<? extends MotionModel> blocks, boolean forOneThread) {
      super(blocks, forOneThread);
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      List<BlockScratch> scratch = layout.scratch();
      for (int k = 0; k < blocks.size(); k++) {
        BlockScratch own = scratch.get(k);
        ((DifferentiableMotion) blocks.get(k))
            .moveJacobian(own.state(state), own.control(control), time, dt, own.square());
        own.putSquare(jacobian, layout.dimension());
      }
    }
  }

  /** Blocks that all know their Hessians too. */
  private static final class TwiceDifferentiableBlocks extends DifferentiableBlocks
      implements TwiceDifferentiableMotion {
    TwiceDifferentiableBlocks(List<? extends MotionModel> blocks, boolean forOneThread) {
      super(blocks, forOneThread);
    }

    @Override
    public void moveHessian(
        double[] state, double[] control, double time, double dt, double[] hessians) {
      List<BlockScratch> scratch = layout.scratch();
      for (int k = 0; k < blocks.size(); k++) {
        BlockScratch own = scratch.get(k);
        ((TwiceDifferentiableMotion) blocks.get(k))
            .moveHessian(own.state(state), own.control(control), time, dt, own.cube());
        own.putCube(hessians, layout.dimension());
      }
    }
  }
}

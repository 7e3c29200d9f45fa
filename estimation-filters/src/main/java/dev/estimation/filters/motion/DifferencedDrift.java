package dev.estimation.filters.motion;

import dev.estimation.core.function.CentralDifferences;
import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;

/** A motion whose drift is differenced. Immutable: each Jacobian has scratch of its own. */
final class DifferencedDrift implements DifferentiableContinuousMotion {
  private final ContinuousMotion motion;
  private final double[] scales;

  DifferencedDrift(ContinuousMotion motion, double[] scales) {
    this.motion = motion;
    this.scales = scales.clone();
    differences(0); // refuses wrong scales now
  }

  private CentralDifferences differences(double time) {
    Space space = motion.stateSpace();
    VectorFunction drift = (state, control, rate) -> motion.drift(state, control, time, rate);
    return new CentralDifferences(space, Space.reals(space.dimension()), drift, scales);
  }

  @Override
  public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
    differences(time).evaluate(state, control, jacobian);
  }

  @Override
  public Space stateSpace() {
    return motion.stateSpace();
  }

  @Override
  public int controlDimension() {
    return motion.controlDimension();
  }

  @Override
  public void drift(double[] state, double[] control, double time, double[] rate) {
    motion.drift(state, control, time, rate);
  }

  @Override
  public void noiseDensity(double[] state, double[] control, double time, double[] density) {
    motion.noiseDensity(state, control, time, density);
  }

  @Override
  public Structure structure() {
    return motion.structure();
  }
}

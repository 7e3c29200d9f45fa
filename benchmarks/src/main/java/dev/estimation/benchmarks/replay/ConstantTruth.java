package dev.estimation.benchmarks.replay;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;

/** Truth that does not change: the place of something that stands still. <i>Immutable.</i> */
public final class ConstantTruth implements Truth {
  private final double[] constants;
  private final int[] components;

  /**
   * The truth of the first components of the state.
   *
   * @param constants copied
   */
  public ConstantTruth(double... constants) {
    this.constants = constants.clone();
    this.components = new int[constants.length];
    for (int i = 0; i < components.length; i++) {
      components[i] = i;
    }
  }

  @Override
  public int[] components() {
    return components.clone();
  }

  @Override
  public FlatSpace space() {
    return Space.reals(constants.length);
  }

  @Override
  public boolean at(double time, double[] values) {
    System.arraycopy(constants, 0, values, 0, constants.length);
    return true;
  }
}

package dev.estimation.benchmarks.replay;

import dev.estimation.core.space.FlatSpace;

/** The true values of some components of the state over time. */
public interface Truth {
  /** {@return the components of the state that are known, in the order of the values} */
  int[] components();

  /** {@return where the values live: reals make up a position, angles a heading} */
  FlatSpace space();

  /**
   * Looks a time up.
   *
   * @param values filled if there is truth at that time
   * @return whether there is
   */
  boolean at(double time, double[] values);
}

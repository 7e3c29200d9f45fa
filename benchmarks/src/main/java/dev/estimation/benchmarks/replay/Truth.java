package dev.estimation.benchmarks.replay;

/** The true values of some components of the state over time. */
public interface Truth {
  /** {@return the components of the state that are known, in the order of the values} */
  int[] components();

  /**
   * Looks a time up.
   *
   * @param values filled if there is truth at that time
   * @return whether there is
   */
  boolean at(double time, double[] values);
}

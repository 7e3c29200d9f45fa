package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.consistency.NormalisedError;

/** Holds estimates against truth, one after another. <i>Confined to one thread.</i> */
public final class TruthComparison {
  private final Truth truth;
  private final FlatSpace space;
  private final int[] components;
  private final double[] values;
  private final double[] error;
  private final NormalisedError normalised;
  private double squared;

  /** A comparison of estimates of a state with the truth of some of its components. */
  public TruthComparison(Space stateSpace, Truth truth) {
    this.truth = truth;
    this.space = truth.space();
    this.components = truth.components();
    this.values = new double[components.length];
    this.error = new double[components.length];
    this.normalised = NormalisedError.of(stateSpace, components);
  }

  /** Compares; false if there is no truth at that time. */
  public boolean compare(double time, Gaussian estimate) {
    if (!truth.at(time, values)) {
      return false;
    }
    for (int i = 0; i < components.length; i++) {
      error[i] = estimate.mean(components[i]);
    }
    space.difference(error, values, error);
    // A covariance without an inverse has no normalised error: NaN.
    squared = normalised.squared(estimate, values);
    return true;
  }

  /** {@return how many components are compared} */
  public int count() {
    return components.length;
  }

  /** {@return which component of the state it is that is compared} */
  public int component(int index) {
    return components[index];
  }

  /** {@return whether it is an angle} */
  public boolean isAngle(int index) {
    return space.isAngle(index);
  }

  /** {@return the true value at the last time} */
  public double truth(int index) {
    return values[index];
  }

  /** {@return the last error, estimate less truth} */
  public double error(int index) {
    return error[index];
  }

  /** {@return the last normalised error squared; NaN if the covariance has no inverse} */
  public double normalisedSquared() {
    return squared;
  }
}

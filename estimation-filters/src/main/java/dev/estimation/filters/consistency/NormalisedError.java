package dev.estimation.filters.consistency;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;

/**
 * The normalised estimation error squared (NEES): e' P^-1 e, with e the error of chosen components and
 * P their covariance.
 *
 * <p>Chi-square with as many degrees of freedom as components if the covariance is honest. Angles are
 * differenced around their seam. <i>Immutable</i>; allocates at each call, for analysis off the step
 * path. Source: Bar-Shalom, Li and Kirubarajan 2001, section 5.4.2.
 */
public final class NormalisedError {
  private final Space space;
  private final int[] components;

  private NormalisedError(Space space, int[] components) {
    this.space = space;
    this.components = components;
  }

  /**
   * The error of some components of a state.
   *
   * @param space where the state lives
   * @param components distinct indices of the components of a difference whose truth is known; copied
   * @return the measure
   */
  public static NormalisedError of(Space space, int... components) {
    Checks.distinctIndices("components", components, space.dimension());
    if (components.length == 0) {
      throw new IllegalArgumentException("components must not be empty");
    }
    return new NormalisedError(space, components.clone());
  }

  /** {@return the number of components} */
  public int degreesOfFreedom() {
    return components.length;
  }

  /**
   * The normalised error squared of an estimate in a space where a point has a number for each component
   * of a difference.
   *
   * @param estimate of the whole state
   * @param truth of the chosen components, in their order
   * @return e' P^-1 e; NaN if the covariance of the components is not positive definite
   * @throws IllegalArgumentException if shapes differ, or the space has quaternions
   */
  public double squared(Gaussian estimate, double[] truth) {
    Checks.length("truth", truth, components.length);
    if (space.storage() != space.dimension()) {
      throw new IllegalArgumentException(
          "truth of single components must be of reals and angles, got" + " the space " + space
              + "; see squaredFrom");
    }
    double[] actual = estimate.mean();
    requireSize(estimate, actual);
    for (int i = 0; i < components.length; i++) {
      actual[components[i]] = truth[i];
    }
    return squaredFrom(estimate, actual);
  }

  /**
   * The normalised error squared of an estimate from a whole point; only the chosen components of their
   * difference count.
   *
   * @param estimate of the whole state
   * @param point the true state; what of it is not known is taken from the mean of the estimate
   * @return e' P^-1 e; NaN if the covariance of the components is not positive definite
   * @throws IllegalArgumentException if shapes differ
   */
  public double squaredFrom(Gaussian estimate, double[] point) {
    Checks.length("point", point, space.storage());
    double[] mean = estimate.mean();
    requireSize(estimate, mean);
    int k = components.length;
    DMatrixRMaj covariance = new DMatrixRMaj(k, k);
    for (int i = 0; i < k; i++) {
      for (int j = 0; j < k; j++) {
        covariance.set(i, j, estimate.covariance(components[i], components[j]));
      }
    }
    LowerFactor factor = new LowerFactor(k);
    if (!factor.factorDefinite(covariance)) {
      return Double.NaN;
    }
    double[] error = new double[space.dimension()];
    space.difference(mean, point, error);
    double[] chosen = new double[k];
    for (int i = 0; i < k; i++) {
      chosen[i] = error[components[i]];
    }
    factor.solveLower(chosen);
    double sum = 0;
    for (double value : chosen) {
      sum += value * value;
    }
    return sum;
  }

  private void requireSize(Gaussian estimate, double[] mean) {
    if (estimate.dimension() != space.dimension() || mean.length != space.storage()) {
      throw new IllegalArgumentException("estimate must have dimension " + space.dimension()
          + " and a mean of " + space.storage() + " numbers, got " + estimate.dimension() + " and "
          + mean.length);
    }
  }
}

package dev.estimation.filters.motion;

/**
 * Components that wander: x' = w, so that F = 1 and Q = q dt. State: one component for each density, in any unit.
 * Linear in all; Q(dt) composes over time exactly. For what stays where it is or changes slowly: a
 * place at rest, a sensor's bias.
 *
 * <p><i>Immutable.</i> Allocates nothing. Source: the textbooks, e.g. Bar-Shalom, Li and Kirubarajan 2001,
 * <i>Estimation with Applications to Tracking and Navigation</i>, chapter 6 (from memory).
 */
public final class RandomWalk extends IntegratedNoise {
  /**
   * The model.
   *
   * @param spectralDensities of the rate of change (unit^2/s), one for each component, finite and 0 or more; copied
   */
  public RandomWalk(double... spectralDensities) {
    super(0, Parameters.densities("RandomWalk spectralDensities", spectralDensities));
  }
}

package dev.estimation.filters.model;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;

/**
 * What a sensor sees of a state: z = h(x, given) + v, v ~ N(0, R).
 *
 * <p>{@code given} is what is known with each measurement: the place of an anchor, of the own ship, of
 * a satellite. Units are SI and radians. Implementations are called by many threads at once and must
 * not keep state that changes. A model that also has a Jacobian is a {@link DifferentiableSensor},
 * one that has a Hessian too a {@link TwiceDifferentiableSensor}. A sensor for part of a state takes the places of
 * its components when it is built; ready ones are in {@code filters.sensor}.
 */
public interface SensorModel {
  /** {@return where measurements live: which components are angles} */
  Space measurementSpace();

  /** {@return the length of {@code given}; 0 if nothing is} */
  default int givenDimension() {
    return 0;
  }

  /**
   * Fills {@code measurement} with h(state, given).
   *
   * @param state read, never kept
   * @param given read, never kept
   * @param measurement filled; arrives filled with NaN, so that a component left out is noticed
   */
  void measure(double[] state, double[] given, double[] measurement);

  /**
   * Fills {@code covariance} with R, symmetric and positive definite.
   *
   * @param state the predicted mean, read, never kept
   * @param given read, never kept
   * @param covariance filled, m x m row by row, m the dimension of the measurement space; arrives
   *     filled with zeros
   */
  void measurementNoise(double[] state, double[] given, double[] covariance);

  /**
   * {@return the components of the state that {@link #measure} reads, and is linear in; all and none unless said
   * otherwise}
   */
  default Structure structure() {
    return Structure.UNKNOWN;
  }
}

package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;

/**
 * The state of one track: a time, a mean and a covariance. Made by {@link FilterPlan#start}; changed
 * only by a step that is applied. <i>Confined to one thread</i> at a time.
 */
public final class Estimate {
  private final Moments moments;
  private double time;

  Estimate(Space space, double time, Gaussian initial) {
    Checks.finite("time", time);
    if (initial.dimension() != space.dimension()) {
      throw new IllegalArgumentException("initial estimate must have dimension " + space.dimension()
          + " to match the state, got " + initial.dimension());
    }
    this.time = time;
    this.moments = new Moments(space);
    moments.set(initial);
    // Angles into their range, quaternions to length 1.
    space.displace(moments.mean(), new double[space.dimension()], moments.changeMean());
  }

  /** {@return the time (s) for which this estimate holds} */
  public double time() {
    return time;
  }

  /**
   * {@return one number of the mean, a point of the state space}
   *
   * @param index from 0
   */
  public double mean(int index) {
    return moments.mean()[index];
  }

  /**
   * {@return the covariance of two components of differences from the mean}
   *
   * @param row from 0
   * @param column from 0
   */
  public double covariance(int row, int column) {
    return moments.covariance().get(row, column);
  }

  /**
   * {@return the standard deviation of one component of differences from the mean}
   *
   * @param index from 0
   */
  public double standardDeviation(int index) {
    return Math.sqrt(covariance(index, index));
  }

  /** {@return where the state lives} */
  public Space space() {
    return moments.space();
  }

  /** {@return mean and covariance as an immutable value} */
  public Gaussian toGaussian() {
    return moments.toGaussian();
  }

  /**
   * Copies mean and covariance, with the factor if there is one; allocates nothing.
   *
   * @param target of the same space, filled
   */
  public void copyInto(Moments target) {
    target.set(moments);
  }

  Moments moments() {
    return moments;
  }

  void requireSpace(Space wanted) {
    Space space = moments.space();
    if (space != wanted && !space.equals(wanted)) {
      throw new IllegalArgumentException(
          "estimate must live in the state space " + wanted + " of the plan, got " + space);
    }
  }

  void replace(double newTime, Moments newMoments) {
    time = newTime;
    moments.set(newMoments);
  }

  @Override
  public String toString() {
    return "Estimate[t = " + time + " s, " + toGaussian() + "]";
  }
}

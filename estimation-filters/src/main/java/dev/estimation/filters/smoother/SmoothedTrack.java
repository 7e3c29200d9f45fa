package dev.estimation.filters.smoother;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;

/**
 * The smoothed estimates of a track, one for each recorded step. Not changed after it is made, so safe
 * to be read by any thread.
 */
public final class SmoothedTrack {
  private final Space space;
  private final double[] times;
  private final double[][] means;
  private final DMatrixRMaj[] covariances;

  SmoothedTrack(Space space, int size) {
    this.space = space;
    this.times = new double[size];
    this.means = new double[size][];
    this.covariances = new DMatrixRMaj[size];
  }

  /** Sets a step; copies the moments. */
  void set(int step, double time, Moments smoothed) {
    times[step] = time;
    means[step] = smoothed.mean().clone();
    covariances[step] = smoothed.covariance().copy();
  }

  /** {@return the number of steps} */
  public int size() {
    return times.length;
  }

  /**
   * {@return the time of a step (s)}
   *
   * @param step from 0
   */
  public double time(int step) {
    return times[step];
  }

  /**
   * {@return one number of the smoothed mean, a point of the state space}
   *
   * @param step from 0
   * @param index from 0
   */
  public double mean(int step, int index) {
    return means[step][index];
  }

  /**
   * {@return the smoothed covariance of two components of differences from the mean}
   *
   * @param step from 0
   * @param row from 0
   * @param column from 0
   */
  public double covariance(int step, int row, int column) {
    return covariances[step].get(row, column);
  }

  /**
   * {@return a smoothed estimate as an immutable value}
   *
   * @param step from 0
   * @throws IllegalArgumentException if rounding has made its covariance indefinite
   */
  public Gaussian gaussian(int step) {
    return Gaussian.of(space, means[step], covariances[step]);
  }
}

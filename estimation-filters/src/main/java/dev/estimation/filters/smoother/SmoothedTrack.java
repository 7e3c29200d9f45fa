package dev.estimation.filters.smoother;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import java.util.List;
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

  SmoothedTrack(Space space, List<RecordedStep> steps) {
    this.space = space;
    int count = steps.size();
    this.times = new double[count];
    this.means = new double[count][];
    this.covariances = new DMatrixRMaj[count];
    for (int k = 0; k < count; k++) {
      RecordedStep step = steps.get(k);
      times[k] = step.time();
      means[k] = step.filtered().mean();
      covariances[k] = step.filtered().covariance();
    }
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

  double[] meanArray(int step) {
    return means[step];
  }

  DMatrixRMaj covarianceMatrix(int step) {
    return covariances[step];
  }
}

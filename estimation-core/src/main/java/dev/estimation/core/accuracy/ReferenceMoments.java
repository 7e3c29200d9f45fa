package dev.estimation.core.accuracy;

import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * Moments of z = g(u) for Gaussian u, and how sure they are. Found by {@link ReferenceSearch}.
 *
 * <p>Errors: with the level before the last, x', each entry x has the error c |x' - x|, where c >= 1 continues
 * the fall of the last two differences as a geometric series. With G independent shifts, whose results are
 * x_g, it is the standard error sqrt(sum (x_g - x)^2 / (G (G - 1))). <i>Immutable.</i>
 */
public final class ReferenceMoments {
  /** Why the moments can be believed. */
  public enum Evidence {
    /** Rules of growing order agree: the function is smooth. */
    CONVERGED_LEVELS,
    /** They do not; independent sets of points scatter as the error tells. The function is not smooth. */
    SHIFTED_POINTS
  }

  private final Evidence evidence;
  private final CarriedMoments moments;
  private final List<CarriedMoments> others;
  private final double weight;
  private final double estimatedError;
  private final int evaluations;

  ReferenceMoments(
      Evidence evidence,
      CarriedMoments moments,
      List<CarriedMoments> others,
      double weight,
      double estimatedError,
      int evaluations) {
    this.evidence = evidence;
    this.moments = moments;
    this.others = List.copyOf(others);
    this.weight = weight;
    this.estimatedError = estimatedError;
    this.evaluations = evaluations;
  }

  ReferenceMoments withEvaluations(int count) {
    return new ReferenceMoments(evidence, moments, others, weight, estimatedError, count);
  }

  /** {@return which of the two ways was taken} */
  public Evidence evidence() {
    return evidence;
  }

  /** {@return the moments, without noise} */
  public CarriedMoments moments() {
    return moments;
  }

  /** {@return the evaluations that the search took, those of other levels included} */
  public int evaluations() {
    return evaluations;
  }

  /** {@return the estimated relative error, in the scale of the search; by points, one standard error} */
  public double estimatedError() {
    return estimatedError;
  }

  /**
   * {@return the estimated error of a component of the mean, in its unit}
   *
   * @param row from 0
   */
  public double meanError(int row) {
    return spread(other -> moments.meanDifference(other)[row]);
  }

  /**
   * {@return the estimated error of an entry of the covariance}
   *
   * @param row from 0
   * @param column from 0
   */
  public double covarianceError(int row, int column) {
    double value = moments.covariance().get(row, column);
    return spread(other -> other.covariance().get(row, column) - value);
  }

  /**
   * {@return the estimated error of an entry of W}
   *
   * @param row from 0
   * @param column from 0
   */
  public double unitCrossCovarianceError(int row, int column) {
    double value = moments.unitCrossCovariance().get(row, column);
    return spread(other -> other.unitCrossCovariance().get(row, column) - value);
  }

  private double spread(ToDoubleFunction<CarriedMoments> difference) {
    return spread(others, weight, difference);
  }

  /** sqrt(weight sum difference^2). */
  static double spread(
      List<CarriedMoments> others, double weight, ToDoubleFunction<CarriedMoments> difference) {
    double squares = 0;
    for (CarriedMoments other : others) {
      double one = difference.applyAsDouble(other);
      squares += one * one;
    }
    return Math.sqrt(weight * squares);
  }

  @Override
  public String toString() {
    return "ReferenceMoments[" + evidence + ", estimated error " + estimatedError + ", "
        + evaluations + " evaluations]";
  }
}

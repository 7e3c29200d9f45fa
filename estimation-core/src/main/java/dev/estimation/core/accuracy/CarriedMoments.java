package dev.estimation.core.accuracy;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Whitening;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * What a matching found of z = g(u) in one call, as a value: mean, covariance P_zz, cross-covariance P_uz, and
 * U = P_zz - W'W, what a linear regression on the input does not explain.
 *
 * <p>With n the dimension of the input and m that of the output, P_uz = L W: L is the lower Cholesky factor of
 * the input's covariance, n x n in natural order, and W, n x m, the cross-covariance in unit coordinates.
 * Matchings take inputs in orders of their own; this brings all to one, so that results compare. Rows of W that
 * belong to a zero variance are zero. Covariance and U contain the additive noise that the matching was
 * given; U is the matching's own, formed without the subtraction.
 *
 * <p>Cost: a copy of each matrix, n^2 m operations for W. <i>Immutable</i>: accessors copy.
 */
public final class CarriedMoments {
  private final Space space;
  private final double[] mean;
  private final DMatrixRMaj covariance;
  private final DMatrixRMaj inputFactor;
  private final DMatrixRMaj unitCross;
  private final DMatrixRMaj unexplained;

  /** Keeps all that it is given. */
  CarriedMoments(
      Space space,
      double[] mean,
      DMatrixRMaj covariance,
      DMatrixRMaj inputFactor,
      DMatrixRMaj unitCross,
      DMatrixRMaj unexplained) {
    this.space = space;
    this.mean = mean;
    this.covariance = covariance;
    this.inputFactor = inputFactor;
    this.unitCross = unitCross;
    this.unexplained = unexplained;
  }

  /**
   * The results of a workspace's last call, which must have been {@code MATCHED}.
   *
   * @param work where they stand, read
   * @param input what was carried, read
   * @return the moments
   */
  public static CarriedMoments of(MatchingWorkspace work, Moments input) {
    Moments output = work.output();
    return of(
        work,
        input,
        output.mean().clone(),
        output.covariance().copy(),
        work.unitCrossCovariance(),
        work.unexplained().matrix().copy());
  }

  /** The given results, which are kept; W, k x m, in the unit coordinates of the workspace is only read. */
  static CarriedMoments of(
      MatchingWorkspace work,
      Moments input,
      double[] mean,
      DMatrixRMaj covariance,
      DMatrixRMaj w,
      DMatrixRMaj unexplained) {
    input.factor();
    DMatrixRMaj factor = input.lowerFactor().copy();
    DMatrixRMaj b = new DMatrixRMaj(factor.numRows, work.activeInputs());
    CommonOps_DDRM.extract(work.inputFactor(), 0, factor.numRows, 0, work.activeInputs(), b, 0, 0);
    DMatrixRMaj cross = new DMatrixRMaj(factor.numRows, w.numCols);
    CommonOps_DDRM.mult(b, w, cross);
    solveLower(factor, cross);
    return new CarriedMoments(work.output().space(), mean, covariance, factor, cross, unexplained);
  }

  /** L^-1 of each column; zero where a pivot is. */
  private static void solveLower(DMatrixRMaj factor, DMatrixRMaj columns) {
    for (int row = 0; row < factor.numRows; row++) {
      double pivot = factor.get(row, row);
      for (int column = 0; column < columns.numCols; column++) {
        double rest = columns.get(row, column);
        for (int before = 0; before < row; before++) {
          rest -= factor.get(row, before) * columns.get(before, column);
        }
        columns.set(row, column, pivot == 0 ? 0 : rest / pivot);
      }
    }
  }

  /**
   * These moments with a noise added to the output.
   *
   * @param noise its covariance, m x m, read
   * @return moments of z + v
   * @throws IllegalArgumentException if the shape is wrong
   */
  public CarriedMoments plusNoise(DMatrixRMaj noise) {
    int m = covariance.numRows;
    if (noise.numRows != m || noise.numCols != m) {
      throw new IllegalArgumentException("noise must be " + m + " x " + m
          + " to match the output, got " + noise.numRows + " x " + noise.numCols);
    }
    DMatrixRMaj total = new DMatrixRMaj(m, m);
    DMatrixRMaj rest = new DMatrixRMaj(m, m);
    CommonOps_DDRM.add(covariance, noise, total);
    CommonOps_DDRM.add(unexplained, noise, rest);
    return new CarriedMoments(space, mean, total, inputFactor, unitCross, rest);
  }

  /** {@return where the output lives} */
  public Space space() {
    return space;
  }

  /** {@return the mean of the output, a point of its space, a copy} */
  public double[] mean() {
    return mean.clone();
  }

  /** {@return P_zz, m x m, a copy} */
  public DMatrixRMaj covariance() {
    return covariance.copy();
  }

  /** {@return L, n x n, lower triangular, a copy} */
  public DMatrixRMaj inputFactor() {
    return inputFactor.copy();
  }

  /** {@return W, n x m, with P_uz = L W, a copy} */
  public DMatrixRMaj unitCrossCovariance() {
    return unitCross.copy();
  }

  /** {@return P_uz = L W, n x m} */
  public DMatrixRMaj crossCovariance() {
    DMatrixRMaj result = new DMatrixRMaj(unitCross.numRows, unitCross.numCols);
    CommonOps_DDRM.mult(inputFactor, unitCross, result);
    return result;
  }

  /** {@return U, m x m, a copy} */
  public DMatrixRMaj unexplained() {
    return unexplained.copy();
  }

  /**
   * The share of the output's covariance that regression on the input does not explain: 0 for an affine
   * function without noise, 1 where the output does not follow the input linearly at all, such as x^2 at 0.
   * It is tr(P_zz^-1/2 U P_zz^-T/2) / m: the mean over directions, in units of standard deviations.
   *
   * @return from 0 to 1
   * @throws IllegalArgumentException if P_zz is not positive definite: a component does not vary
   */
  public double unexplainedShare() {
    double sum = 0;
    for (double value : unexplainedShares()) {
      sum += value;
    }
    return sum / covariance.numRows;
  }

  /**
   * The same in the worst direction: the largest eigenvalue of P_zz^-1/2 U P_zz^-T/2.
   *
   * @return from 0 to 1
   * @throws IllegalArgumentException as {@link #unexplainedShare()}
   */
  public double worstUnexplainedShare() {
    double worst = 0;
    for (double value : unexplainedShares()) {
      worst = Math.max(worst, value);
    }
    return worst;
  }

  private double[] unexplainedShares() {
    Whitening whitening = new Whitening(covariance);
    if (!whitening.isDefinite()) {
      throw new IllegalArgumentException(
          "covariance of the output must be positive definite for a share of it to be unexplained: "
              + whitening.failure());
    }
    return whitening.eigenvalues(unexplained);
  }

  /** delta, the mean of another as seen from this one's. */
  double[] meanDifference(CarriedMoments other) {
    double[] difference = new double[space.dimension()];
    space.difference(other.mean, mean, difference);
    return difference;
  }

  /** The largest difference of entries of mean, covariance and W, in standard deviations of the outputs. */
  static double largestDifference(CarriedMoments reference, CarriedMoments other) {
    double[] shift = reference.meanDifference(other);
    double largest = 0;
    for (int i = 0; i < shift.length; i++) {
      double deviation = Math.sqrt(reference.covariance.get(i, i));
      largest = Math.max(largest, scaled(shift[i], deviation));
      for (int j = 0; j <= i; j++) {
        double scale = deviation * Math.sqrt(reference.covariance.get(j, j));
        double change = other.covariance.get(i, j) - reference.covariance.get(i, j);
        largest = Math.max(largest, scaled(change, scale));
      }
      for (int j = 0; j < reference.unitCross.numRows; j++) {
        double change = other.unitCross.get(j, i) - reference.unitCross.get(j, i);
        largest = Math.max(largest, scaled(change, deviation));
      }
    }
    return largest;
  }

  private static double scaled(double change, double scale) {
    return change == 0 ? 0 : Math.abs(change) / scale;
  }
}

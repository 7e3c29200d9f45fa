package dev.estimation.core.accuracy;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.points.UnitPoints;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * One random shift: a workspace over N points xi of N(0, I) with a mean a and a covariance C of their own, which
 * would spoil affine parts. With W and P what the points give about their means, and a fixed slope B close to C^-1
 * W, e = z - B' xi has U = P - W'B - B'W + B'C B and cross-covariance D = W - C B; so the results are mean less B'
 * a, U, W = B + D. They are exact for affine functions, and free of bias up to that of dividing by N as far as B
 * does not depend on the shift: B is the average slope of all shifts. (Control variates; Hammersley and Handscomb
 * 1964, <i>Monte Carlo Methods</i>, from memory.)
 */
final class ShiftedPoints {
  private final MatchingWorkspace work;
  private final double[] pointMean;
  private final DMatrixRMaj pointCovariance;
  private final LowerFactor factor;

  /** A workspace over these points, and the points once more. */
  ShiftedPoints(MatchingWorkspace work, UnitPoints points) {
    this.work = work;
    int k = points.dimension();
    this.pointMean = new double[k];
    for (int i = 0; i < points.size(); i++) {
      for (int a = 0; a < k; a++) {
        pointMean[a] += points.coordinate(i, a) / points.size();
      }
    }
    this.factor = new LowerFactor(k);
    this.pointCovariance = covariance(points);
    if (!factor.factorDefinite(pointCovariance)) {
      throw new IllegalArgumentException("shifted points must be more than the active inputs, got "
          + points.size() + " points and " + k + " inputs: " + factor.failure());
    }
  }

  private DMatrixRMaj covariance(UnitPoints points) {
    int k = points.dimension();
    DMatrixRMaj result = new DMatrixRMaj(k, k);
    for (int i = 0; i < points.size(); i++) {
      for (int a = 0; a < k; a++) {
        double da = points.coordinate(i, a) - pointMean[a];
        for (int b = 0; b <= a; b++) {
          result.data[a * k + b] += da * (points.coordinate(i, b) - pointMean[b]) / points.size();
        }
      }
    }
    SymmetricMatrix.mirrorLower(result);
    return result;
  }

  MatchingWorkspace work() {
    return work;
  }

  /** C^-1 W of the workspace's last call, k x m. */
  DMatrixRMaj slope() {
    DMatrixRMaj w = work.unitCrossCovariance();
    DMatrixRMaj columns = CommonOps_DDRM.transpose(w, null);
    for (int c = 0; c < w.numCols; c++) {
      factor.solve(columns.data, c * w.numRows);
    }
    return CommonOps_DDRM.transpose(columns, null);
  }

  /** The results of the workspace's last call, given B. */
  CarriedMoments corrected(Moments input, DMatrixRMaj slope) {
    DMatrixRMaj w = work.unitCrossCovariance();
    DMatrixRMaj rest = w.copy();
    CommonOps_DDRM.multAdd(-1, pointCovariance, slope, rest);
    DMatrixRMaj unexplained = work.output().covariance().copy();
    CommonOps_DDRM.multAddTransA(-1, w, slope, unexplained);
    CommonOps_DDRM.multAddTransA(-1, slope, rest, unexplained);
    SymmetricMatrix.mirrorLower(unexplained);
    DMatrixRMaj cross = new DMatrixRMaj(w.numRows, w.numCols);
    CommonOps_DDRM.add(slope, rest, cross);
    return CarriedMoments.of(
        work, input, mean(slope), PooledMoments.total(unexplained, cross), cross, unexplained);
  }

  private double[] mean(DMatrixRMaj slope) {
    double[] mean = work.mean().clone();
    double[] shift = new double[slope.numCols];
    for (int c = 0; c < slope.numCols; c++) {
      for (int a = 0; a < slope.numRows; a++) {
        shift[c] -= slope.get(a, c) * pointMean[a];
      }
    }
    work.output().space().displace(mean, shift, mean);
    return mean;
  }
}

package dev.estimation.core.accuracy;

import dev.estimation.core.internal.SymmetricMatrix;
import java.util.List;
import java.util.function.Function;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * Estimates of the same moments by G independent shifts as one. Mean and W are averages. Each U_g was taken about its
 * own mean and lacks its scatter: U = average U_g + sum (m_g - m)(m_g - m)' / (G - 1). P_zz = U + W'W.
 */
final class PooledMoments {
  private PooledMoments() {}

  static CarriedMoments of(List<CarriedMoments> parts) {
    CarriedMoments first = parts.get(0);
    double[] shift = new double[first.space().dimension()];
    for (CarriedMoments part : parts) {
      double[] difference = first.meanDifference(part);
      for (int i = 0; i < shift.length; i++) {
        shift[i] += difference[i] / parts.size();
      }
    }
    double[] mean = first.mean();
    first.space().displace(mean, shift, mean);
    DMatrixRMaj cross = average(parts, CarriedMoments::unitCrossCovariance);
    DMatrixRMaj unexplained = average(parts, CarriedMoments::unexplained);
    CommonOps_DDRM.addEquals(unexplained, scatter(parts, first, shift));
    DMatrixRMaj covariance = total(unexplained, cross);
    return new CarriedMoments(
        first.space(), mean, covariance, first.inputFactor(), cross, unexplained);
  }

  private static DMatrixRMaj average(
      List<CarriedMoments> parts, Function<CarriedMoments, DMatrixRMaj> entry) {
    DMatrixRMaj sum = entry.apply(parts.get(0));
    for (CarriedMoments part : parts.subList(1, parts.size())) {
      CommonOps_DDRM.addEquals(sum, entry.apply(part));
    }
    CommonOps_DDRM.divide(sum, parts.size());
    return sum;
  }

  /** sum (m_g - m)(m_g - m)' / (G - 1). */
  private static DMatrixRMaj scatter(
      List<CarriedMoments> parts, CarriedMoments first, double[] shift) {
    int m = shift.length;
    DMatrixRMaj result = new DMatrixRMaj(m, m);
    for (CarriedMoments part : parts) {
      double[] difference = first.meanDifference(part);
      for (int i = 0; i < m; i++) {
        difference[i] -= shift[i];
        for (int j = 0; j <= i; j++) {
          result.data[i * m + j] += difference[i] * difference[j] / (parts.size() - 1.0);
        }
      }
    }
    SymmetricMatrix.mirrorLower(result);
    return result;
  }

  /** U + W'W. */
  static DMatrixRMaj total(DMatrixRMaj unexplained, DMatrixRMaj w) {
    DMatrixRMaj result = unexplained.copy();
    CommonOps_DDRM.multAddTransA(w, w, result);
    SymmetricMatrix.mirrorLower(result);
    return result;
  }
}

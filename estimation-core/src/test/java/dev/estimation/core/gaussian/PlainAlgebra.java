package dev.estimation.core.gaussian;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import org.ejml.data.DMatrixRMaj;

/** Textbook formulas with explicit inverses, by a general library: the second route of these tests. */
final class PlainAlgebra {
  private PlainAlgebra() {}

  static RealMatrix matrix(DMatrixRMaj from) {
    RealMatrix result = new Array2DRowRealMatrix(from.numRows, from.numCols);
    for (int i = 0; i < from.numRows; i++) {
      for (int j = 0; j < from.numCols; j++) {
        result.setEntry(i, j, from.get(i, j));
      }
    }
    return result;
  }

  static RealMatrix covariance(Gaussian value) {
    return matrix(value.covariance());
  }

  static RealMatrix column(double... values) {
    return MatrixUtils.createColumnRealMatrix(values);
  }

  static RealMatrix inverse(RealMatrix a) {
    return MatrixUtils.inverse(a);
  }

  /** A Gaussian from a nearly symmetric covariance. */
  static Gaussian gaussian(RealMatrix mean, RealMatrix covariance) {
    RealMatrix symmetric = covariance.add(covariance.transpose()).scalarMultiply(0.5);
    return Gaussian.of(mean.getColumn(0), symmetric.getData());
  }

  /** Weighted least squares of z = H x + v, v ~ N(0, R), by normal equations. */
  static Gaussian leastSquares(RealMatrix h, RealMatrix r, RealMatrix z) {
    RealMatrix weighted = h.transpose().multiply(inverse(r));
    RealMatrix covariance = inverse(weighted.multiply(h));
    return gaussian(covariance.multiply(weighted).multiply(z), covariance);
  }

  /** One below the other. */
  static RealMatrix stack(RealMatrix a, RealMatrix b) {
    RealMatrix result =
        new Array2DRowRealMatrix(a.getRowDimension() + b.getRowDimension(), a.getColumnDimension());
    result.setSubMatrix(a.getData(), 0, 0);
    result.setSubMatrix(b.getData(), a.getRowDimension(), 0);
    return result;
  }

  /** Two blocks on the diagonal. */
  static RealMatrix blocks(RealMatrix a, RealMatrix b) {
    int n = a.getRowDimension();
    RealMatrix result = new Array2DRowRealMatrix(n + b.getRowDimension(), n + b.getRowDimension());
    result.setSubMatrix(a.getData(), 0, 0);
    result.setSubMatrix(b.getData(), n, n);
    return result;
  }
}

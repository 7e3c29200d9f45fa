package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static dev.estimation.testing.Agreement.largest;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** z = A u + c with its exact moments A m + c, A P A' + N and P A'. */
final class AffineProblem {
  final DMatrixRMaj matrix;
  final double[] offset;
  final Moments input;
  final DMatrixRMaj noise;

  AffineProblem(DMatrixRMaj matrix, double[] offset, Moments input, DMatrixRMaj noise) {
    this.matrix = matrix;
    this.offset = offset;
    this.input = input;
    this.noise = noise;
  }

  AffineFunction function() {
    return new AffineFunction(matrix, offset);
  }

  double[] mean() {
    double[] result = new double[matrix.numRows];
    function().evaluate(input.mean(), null, result);
    return result;
  }

  DMatrixRMaj cross() {
    DMatrixRMaj result = new DMatrixRMaj(matrix.numCols, matrix.numRows);
    CommonOps_DDRM.multTransB(input.covariance(), matrix, result);
    return result;
  }

  DMatrixRMaj covarianceWithoutNoise() {
    DMatrixRMaj result = new DMatrixRMaj(matrix.numRows, matrix.numRows);
    CommonOps_DDRM.mult(matrix, cross(), result);
    return result;
  }

  DMatrixRMaj covariance() {
    DMatrixRMaj result = covarianceWithoutNoise();
    if (noise != null) {
      CommonOps_DDRM.addEquals(result, noise);
    }
    return result;
  }

  private double magnitude() {
    double size = Math.max(largest(input.mean()), largest(mean()));
    return Math.max(size, Math.max(largest(offset), 1));
  }

  /** The smallest standard deviation made by the input alone, above zero. */
  private double deviation() {
    double smallest = 1;
    DMatrixRMaj covariance = covarianceWithoutNoise();
    for (int i = 0; i < covariance.numRows; i++) {
      smallest = Math.min(smallest, Math.sqrt(covariance.get(i, i)));
    }
    return smallest;
  }

  /** Carries the problem by a matching and compares with the exact moments. */
  void check(MatchingUnderTest subject, double... scales) {
    int n = matrix.numCols;
    Space from = input.space();
    Space to = Space.reals(matrix.numRows);
    MatchingWorkspace work =
        subject.formed(scales).workspace(from, to, subject.offered(function()));
    Outcome outcome = Outcome.of(work, input, new double[0], noise);
    assertVector("mean", mean(), outcome.mean, subject.meanRounding(n, magnitude()), 1);
    double rounding = subject.covarianceRounding(n, magnitude(), deviation());
    assertCovariance("covariance", covariance(), outcome.covariance, rounding);
    DMatrixRMaj wanted = cross();
    DMatrixRMaj got = outcome.cross();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < matrix.numRows; j++) {
        double scale = Math.sqrt(input.covariance().get(i, i))
            * Math.sqrt(covarianceWithoutNoise().get(j, j));
        String entry = "cross-covariance[" + i + "][" + j + "]";
        assertWithin(entry, wanted.get(i, j), got.get(i, j), rounding, scale);
      }
    }
  }
}

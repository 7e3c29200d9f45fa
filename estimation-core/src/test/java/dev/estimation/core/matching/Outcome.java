package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** A copy of the results of a call that succeeded. */
final class Outcome {
  final double[] mean;
  final DMatrixRMaj covariance;
  final DMatrixRMaj factor;
  final DMatrixRMaj unitCross;

  private Outcome(MatchingWorkspace work) {
    mean = work.output().mean().clone();
    covariance = work.output().covariance().copy();
    factor = CommonOps_DDRM.extract(
        work.inputFactor(), 0, work.inputFactor().numRows, 0, work.activeInputs());
    unitCross = work.unitCrossCovariance().copy();
  }

  /** Carries moments, which must succeed. */
  static Outcome of(MatchingWorkspace work, Moments input, double[] given, DMatrixRMaj noise) {
    assertEquals(
        MatchingStatus.MATCHED,
        work.carry(input, given, RandomGaussians.noise(noise)),
        work::failure);
    assertEquals("", work.failure());
    return new Outcome(work);
  }

  /** Carries moments without noise, with one given number, 0. */
  static Outcome of(MatchingWorkspace work, Moments input) {
    return of(work, input, new double[1], null);
  }

  /** P_uz = B W. */
  DMatrixRMaj cross() {
    DMatrixRMaj product = new DMatrixRMaj(factor.numRows, unitCross.numCols);
    CommonOps_DDRM.mult(factor, unitCross, product);
    return product;
  }

  /** The smallest standard deviation of the output. */
  double smallestDeviation() {
    double smallest = Double.POSITIVE_INFINITY;
    for (int i = 0; i < covariance.numRows; i++) {
      smallest = Math.min(smallest, Math.sqrt(covariance.get(i, i)));
    }
    return smallest;
  }

  /** Every number the same, bit for bit. */
  static void assertSame(Outcome expected, Outcome actual) {
    assertSameBits("mean", expected.mean, actual.mean);
    assertSameBits("covariance", expected.covariance, actual.covariance);
    assertSameBits("input factor", expected.factor, actual.factor);
    assertSameBits("unit cross-covariance", expected.unitCross, actual.unitCross);
  }
}

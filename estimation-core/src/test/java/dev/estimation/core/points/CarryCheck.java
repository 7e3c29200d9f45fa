package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertSameBits;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** Points put to use by {@link PointMatching}. */
final class CarryCheck {
  private CarryCheck() {}

  /** Algebra: A u + c has the mean A m + c, the covariance A P A' and the cross-covariance P A'. */
  static void affineMapIsExact(UnitPoints points) {
    int n = points.dimension();
    RandomGaussians random = new RandomGaussians(31 + n);
    DMatrixRMaj matrix = random.matrix(2, n);
    AffineFunction function = new AffineFunction(matrix, random.vector(2));
    Moments input = random.moments(n);
    double[] mean = new double[2];
    function.evaluate(input.mean(), null, mean);
    DMatrixRMaj cross = new DMatrixRMaj(n, 2);
    CommonOps_DDRM.multTransB(input.covariance(), matrix, cross);
    DMatrixRMaj covariance = new DMatrixRMaj(2, 2);
    CommonOps_DDRM.mult(matrix, cross, covariance);

    MatchingWorkspace work = carried(points, input, 2, function);
    double rounding = rounding(points);
    DMatrixRMaj gotCross = new DMatrixRMaj(n, 2);
    CommonOps_DDRM.mult(work.inputFactor(), work.unitCrossCovariance(), gotCross);
    assertVector("mean", mean, work.output().mean(), rounding, 1);
    assertMatrix("cross-covariance", cross, gotCross, rounding, 1);
    assertMatrix("covariance", covariance, work.output().covariance(), rounding, 1);
  }

  /**
   * Numbers of size 30 (a mean, and a few deviations off it) have each deviation d_i wrong by some eps; it
   * enters the mean with w_i, covariances with w_i times the place of the point and a size to 10.
   */
  private static double rounding(UnitPoints points) {
    double sensitivity = points.weightAmplification();
    for (int i = 0; i < points.size(); i++) {
      sensitivity += 10 * Math.abs(points.weight(i)) * length(UnitMoments.place(points, i));
    }
    return 30 * 8 * 0x1p-52 * sensitivity;
  }

  private static double length(double[] place) {
    double sum = 0;
    for (double x : place) {
      sum += x * x;
    }
    return Math.sqrt(sum);
  }

  static void inputIsUntouchedAndResultsRepeat(UnitPoints points) {
    int n = points.dimension();
    Moments input = new RandomGaussians(n).moments(n);
    double[] mean = input.mean().clone();
    DMatrixRMaj covariance = input.covariance().copy();
    VectorFunction bent = new BentFunction(n, 3, n);
    MatchingWorkspace one = carried(points, input, 3, bent);
    assertSameBits("mean", mean, input.mean());
    assertSameBits("covariance", covariance, input.covariance());
    MatchingWorkspace two = carried(points, input, 3, bent);
    assertSameBits("mean", one.output().mean(), two.output().mean());
    assertSameBits("covariance", one.output().covariance(), two.output().covariance());
    assertSameBits("cross", one.unitCrossCovariance(), two.unitCrossCovariance());
  }

  private static MatchingWorkspace carried(
      UnitPoints points, Moments input, int outputs, VectorFunction function) {
    MatchingWorkspace work = PointMatching.of(dimension -> points)
        .workspace(input.space(), Space.reals(outputs), function);
    assertEquals(MatchingStatus.MATCHED, work.carry(input, new double[1], null), work::failure);
    return work;
  }
}

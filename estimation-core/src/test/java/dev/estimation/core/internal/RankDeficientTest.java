package dev.estimation.core.internal;

import static dev.estimation.testing.Agreement.assertMatrix;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * A A' with A of n x r, r below n: semi-definite by algebra, indefinite by rounding. A covariance
 * of that kind comes out of exact constraints and of noise that enters through fewer channels.
 */
class RankDeficientTest {
  /**
   * Leading blocks may be ill-conditioned by chance, which multiplies n eps by up to 1e6: 1e-8 of
   * the largest entry for L L'.
   */
  @ParameterizedTest
  @ValueSource(ints = {2, 3, 4, 6, 8, 12, 15, 20})
  void productsOfThinMatricesAreAccepted(int n) {
    for (int r = 1; r < n; r++) {
      for (int seed = 0; seed < 20; seed++) {
        DMatrixRMaj root = new RandomGaussians(10_000L * n + 100L * r + seed).matrix(n, r);
        accept(LowerFactorTest.square(root), "n = " + n + ", rank " + r + ", seed " + seed, 1e-8);
      }
    }
  }

  /**
   * The same with a well-conditioned leading block, so that no pivot but the last ones is small; n
   * eps times a condition number to 1e2: 1e-12.
   */
  @ParameterizedTest
  @ValueSource(ints = {2, 3, 4, 6, 8, 12, 15, 20})
  void productsWithWellConditionedLeadingColumnsAreAccepted(int n) {
    for (int r = 1; r < n; r++) {
      for (int seed = 0; seed < 20; seed++) {
        DMatrixRMaj root = new RandomGaussians(20_000L * n + 100L * r + seed).matrix(n, r);
        CommonOps_DDRM.scale(0.3 / Math.sqrt(r), root);
        for (int i = 0; i < r; i++) {
          root.add(i, i, 2);
        }
        accept(LowerFactorTest.square(root), "n = " + n + ", rank " + r + ", seed " + seed, 1e-12);
      }
    }
  }

  private static void accept(DMatrixRMaj p, String which, double tolerance) {
    LowerFactor factor = new LowerFactor(p.numRows);
    assertTrue(factor.factorSemidefinite(p), () -> which + ": " + factor.failure());
    double size = CommonOps_DDRM.elementMaxAbs(p);
    assertMatrix(which, p, LowerFactorTest.square(factor.columns()), tolerance, size);
  }

  /** One direction is known exactly: x1 = x0 / unit + x2 unit. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-9, 1e-3, 1, 1e3, 1e9})
  void aLinearConstraintIsAccepted(double unit) {
    for (int seed = 0; seed < 200; seed++) {
      DMatrixRMaj two = new RandomGaussians(seed).covariance(2);
      DMatrixRMaj map = DMatrixRMaj.wrap(3, 2, new double[] {unit, 0, 1, 1, 0, 1 / unit});
      DMatrixRMaj half = new DMatrixRMaj(3, 2);
      DMatrixRMaj p = new DMatrixRMaj(3, 3);
      CommonOps_DDRM.mult(map, two, half);
      CommonOps_DDRM.multTransB(half, map, p);
      SymmetricMatrix.mirrorLower(p);
      LowerFactor factor = new LowerFactor(3);
      int which = seed;
      assertTrue(factor.factorSemidefinite(p), () -> "seed " + which + ": " + factor.failure());
    }
  }

  /**
   * P - 1.1 tr(P) dd' with a unit vector d: along d it is negative, as d'Pd is at most the trace,
   * and that by a tenth of the trace, far above rounding.
   */
  @ParameterizedTest
  @ValueSource(ints = {2, 4, 8, 12})
  void clearlyIndefiniteMatricesAreRefused(int n) {
    for (int seed = 0; seed < 20; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      DMatrixRMaj p = LowerFactorTest.square(random.matrix(n, n));
      DMatrixRMaj direction = random.matrix(n, 1);
      double length = NormOps_DDRM.normF(direction);
      CommonOps_DDRM.scale(Math.sqrt(1.1 * CommonOps_DDRM.trace(p)) / length, direction);
      CommonOps_DDRM.subtract(p, LowerFactorTest.square(direction), p);
      assertFalse(new LowerFactor(n).factorSemidefinite(p), "seed " + seed);
    }
  }
}

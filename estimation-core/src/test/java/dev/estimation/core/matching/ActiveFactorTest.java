package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertMatrix;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.RowOrder;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;

/** Factors with some inputs taken first. 1e-13: condition numbers of a few hundred, entries of order 1. */
class ActiveFactorTest {
  private static final double ROUNDING = 1e-13;

  private static DMatrixRMaj rowsOf(DMatrixRMaj matrix, ActiveFactor active) {
    DMatrixRMaj result = new DMatrixRMaj(matrix.numRows, matrix.numCols);
    for (int q = 0; q < matrix.numRows; q++) {
      for (int c = 0; c < matrix.numCols; c++) {
        result.set(q, c, matrix.get(active.input(q), c));
      }
    }
    return result;
  }

  /** The same as the Cholesky factor of the permuted covariance: that is unique. */
  @Test
  void isTheFactorOfThePermutedMatrix() {
    for (int n = 1; n <= 8; n++) {
      for (int seed = 0; seed < 10; seed++) {
        RandomGaussians random = new RandomGaussians(100 * n + seed);
        Moments input = random.moments(n);
        int[] first = Arrays.copyOf(random.permutation(n), 1 + seed % n);
        ActiveFactor active = new ActiveFactor(first, n);
        assertTrue(active.factor(input));
        for (int a = 0; a < first.length; a++) {
          assertEquals(first[a], active.input(a));
        }
        DMatrixRMaj p = input.covariance();
        DMatrixRMaj permuted = new DMatrixRMaj(n, n);
        for (int i = 0; i < n; i++) {
          for (int j = 0; j < n; j++) {
            permuted.set(i, j, p.get(active.input(i), active.input(j)));
          }
        }
        LowerFactor wanted = new LowerFactor(n);
        assertTrue(wanted.factorSemidefinite(permuted));
        assertMatrix("L", wanted.columns(), rowsOf(active.factor(), active), ROUNDING, 1);
      }
    }
  }

  /** Zero variances come first, in the middle and last; a column whose pivot is zero is zero. */
  @Test
  void zeroVariancesGiveZeroColumns() {
    RandomGaussians random = new RandomGaussians(5);
    for (int frozen = 0; frozen < 4; frozen++) {
      DMatrixRMaj p = random.covariance(4);
      for (int i = 0; i < 4; i++) {
        p.set(i, frozen, 0);
        p.set(frozen, i, 0);
      }
      Moments input = RandomGaussians.momentsOf(Gaussian.of(new double[4], p));
      for (int[] first : new int[][] {{3, 1}, {2}, {1, 0, 3}, {3, 2, 1, 0}}) {
        ActiveFactor active = new ActiveFactor(first, 4);
        assertTrue(active.factor(input));
        DMatrixRMaj square = new DMatrixRMaj(4, 4);
        CommonOps_DDRM.multTransB(active.factor(), active.factor(), square);
        assertMatrix("P", p, square, ROUNDING, 1);
        DMatrixRMaj lower = rowsOf(active.factor(), active);
        for (int q = 0; q < 4; q++) {
          for (int r = 0; r < 4 && lower.get(q, q) == 0; r++) {
            assertEquals(0.0, lower.get(r, q), "column of a zero variance");
          }
          for (int c = q + 1; c < 4; c++) {
            assertEquals(0.0, lower.get(q, c), "above the diagonal");
          }
        }
      }
    }
  }

  /** There and back again. */
  @Test
  void theNaturalOrderComesBack() {
    for (int n = 1; n <= 8; n++) {
      RandomGaussians random = new RandomGaussians(700 + n);
      Moments input = random.moments(n);
      ActiveFactor active = new ActiveFactor(Arrays.copyOf(random.permutation(n), 1 + n / 2), n);
      assertTrue(active.factor(input));
      DMatrixRMaj back = active.factor().copy();
      new RowOrder(active.order(), RowOrder.natural(n)).apply(back.data);
      assertMatrix("L", input.lowerFactor(), back, ROUNDING, 1);
    }
  }
}

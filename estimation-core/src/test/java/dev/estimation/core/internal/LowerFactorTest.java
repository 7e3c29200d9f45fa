package dev.estimation.core.internal;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertSameBits;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Cholesky factors: what they multiply to, and which matrices have none. */
class LowerFactorTest {
  /** Backward error of a Cholesky factor, n eps per entry relative to the diagonal (n to 20). */
  private static final double ROUNDING = 40 * 0x1p-52;

  static DMatrixRMaj square(DMatrixRMaj root) {
    DMatrixRMaj product = new DMatrixRMaj(root.numRows, root.numRows);
    CommonOps_DDRM.multTransB(root, root, product);
    SymmetricMatrix.mirrorLower(product);
    return product;
  }

  private static DMatrixRMaj matrix(double... rowByRow) {
    int n = (int) Math.round(Math.sqrt(rowByRow.length));
    return DMatrixRMaj.wrap(n, n, rowByRow);
  }

  @Test
  void theFactorIsLowerAndMultipliesToTheMatrix() {
    for (int n = 1; n <= 20; n++) {
      DMatrixRMaj p = new RandomGaussians(n).covariance(n);
      LowerFactor factor = new LowerFactor(n);
      assertTrue(factor.factorDefinite(p), factor::failure);
      DMatrixRMaj l = factor.columns();
      for (int i = 0; i < n; i++) {
        for (int j = i + 1; j < n; j++) {
          assertEquals(0, l.get(i, j));
        }
      }
      assertMatrix("L L'", p, square(l), ROUNDING, CommonOps_DDRM.elementMax(p));
    }
  }

  /** By hand: [[4, 2, -2], [2, 10, 2], [-2, 2, 6]] has the factor [[2], [1, 3], [-1, 1, 2]]. */
  @Test
  void aFactorOfWholeNumbers() {
    LowerFactor factor = new LowerFactor(3);
    assertTrue(factor.factorDefinite(matrix(4, 2, -2, 2, 10, 2, -2, 2, 6)));
    DMatrixRMaj wanted = matrix(2, 0, 0, 1, 3, 0, -1, 1, 2);
    // 1 / sqrt(pivot) times the pivot: two roundings.
    assertMatrix("L", wanted, factor.columns(), 2 * 0x1p-52, 3);
    double[] b = {2, 10, 7};
    factor.solveLower(b);
    assertWithin("y0", 1, b[0], 4 * 0x1p-52, 1);
    assertWithin("y1", 3, b[1], 4 * 0x1p-52, 3);
    assertWithin("y2", 2.5, b[2], 8 * 0x1p-52, 3);
    assertWithin("ln det", Math.log(144), factor.logDeterminant(), 8 * 0x1p-52, 5);
  }

  /** P = L L', also for sizes that are no multiple of three. */
  @Test
  void columnsReproduceTheMatrix() {
    for (int n = 1; n <= 12; n++) {
      DMatrixRMaj p = new RandomGaussians(300 + n).covariance(n);
      LowerFactor factor = new LowerFactor(n);
      assertTrue(factor.factorSemidefinite(p));
      assertMatrix("L L'", p, square(factor.columns()), ROUNDING, 10);
      for (int i = 0; i < n; i++) {
        for (int j = i + 1; j < n; j++) {
          assertEquals(0.0, factor.columns().get(i, j), "above the diagonal");
        }
      }
    }
  }

  @Test
  void zeroVariancesGiveZeroColumns() {
    DMatrixRMaj p = matrix(4, 0, 2, 0, 0, 0, 2, 0, 5);
    LowerFactor factor = new LowerFactor(3);
    assertTrue(factor.factorSemidefinite(p));
    assertSameBits("L", matrix(2, 0, 0, 0, 0, 0, 1, 0, 2), factor.columns());
    assertFalse(factor.factorDefinite(p));
    assertNames(factor.failure(), "pivot 2 of 3 is 0.0");
    assertTrue(factor.factorSemidefinite(new DMatrixRMaj(3, 3)));
    assertSameBits("L", new DMatrixRMaj(3, 3), factor.columns());
  }

  /** What a definite factor asks: a pivot above n eps of its diagonal entry. */
  @Test
  void aPivotOfRoundingSizeIsNotDefinite() {
    LowerFactor factor = new LowerFactor(2);
    DMatrixRMaj nearly = matrix(1, 1, 1, 1 + 0x1p-52);
    assertFalse(factor.factorDefinite(nearly));
    assertNames(factor.failure(), "pivot 2 of 2", Double.toString(0x1p-52));
    assertTrue(factor.factorSemidefinite(nearly));
    assertTrue(factor.factorDefinite(matrix(1, 1, 1, 1 + 4 * 0x1p-52)));
    // Relative to its own diagonal, never absolute.
    assertTrue(factor.factorDefinite(matrix(1e-300, 0, 0, 1e300)));
    assertTrue(factor.factorDefinite(matrix(1e300, 0, 0, 1e-300)));
  }

  @Test
  void indefiniteMatricesHaveNoFactor() {
    LowerFactor factor = new LowerFactor(3);
    assertFalse(factor.factorSemidefinite(matrix(1, 0, 0, 0, 1, 2, 0, 2, 1)));
    assertNames(factor.failure(), "pivot 3 of 3 is -3.0");
    assertFalse(factor.factorSemidefinite(matrix(-1e-300, 0, 0, 0, 1, 0, 0, 0, 1)));
    assertNames(factor.failure(), "pivot 1 of 3", "-1.0E-300");
    assertFalse(factor.factorSemidefinite(matrix(0, 1e-20, 0, 1e-20, 1, 0, 0, 0, 1)));
    assertNames(factor.failure(), "pivot 1 of 3 is 0.0");
  }

  /** EJML's own factor accepts some of these. */
  @ParameterizedTest
  @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
  void numbersThatAreNotFiniteFailWhereverTheyStand(double bad) {
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j <= i; j++) {
        DMatrixRMaj p = new RandomGaussians(1).covariance(4);
        p.set(i, j, bad);
        p.set(j, i, bad);
        LowerFactor factor = new LowerFactor(4);
        String place = bad + " at [" + i + "][" + j + "]";
        assertFalse(factor.factorSemidefinite(p), place);
        assertFalse(factor.factorDefinite(p), place);
        DMatrixRMaj zeros = new DMatrixRMaj(4, 4);
        zeros.set(i, j, bad);
        zeros.set(j, i, bad);
        assertFalse(factor.factorSemidefinite(zeros), place + " among zeros");
      }
    }
  }

  @Test
  void aFailureIsForgottenAndCopiesAreWhole() {
    LowerFactor factor = new LowerFactor(2);
    assertFalse(factor.factorDefinite(matrix(1, 2, 2, 1)));
    assertTrue(factor.factorDefinite(matrix(4, 2, 2, 10)));
    LowerFactor copy = new LowerFactor(2);
    copy.set(factor);
    assertTrue(factor.factorDefinite(matrix(1, 0, 0, 1)));
    assertMatrix("copy", matrix(2, 0, 1, 3), copy.columns(), 2 * 0x1p-52, 3);
  }
}

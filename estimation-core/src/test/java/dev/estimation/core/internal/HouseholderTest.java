package dev.estimation.core.internal;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.QRDecomposition;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Reductions of random matrices. 1e-13 throughout: a few dozen roundings on entries of order 1. */
class HouseholderTest {
  private static final double ROUNDING = 1e-13;

  /** The upper triangle of the first columns, the scratch below left out. */
  private static DMatrixRMaj triangle(DMatrixRMaj a, int reduced) {
    double[] data = a.data.clone();
    Householder.triangularise(data, a.numRows, a.numCols, reduced);
    DMatrixRMaj r = new DMatrixRMaj(reduced, reduced);
    for (int i = 0; i < reduced; i++) {
      System.arraycopy(data, i * a.numCols + i, r.data, i * reduced + i, reduced - i);
    }
    return r;
  }

  private static DMatrixRMaj leading(DMatrixRMaj a, int columns) {
    return CommonOps_DDRM.extract(a, 0, a.numRows, 0, columns);
  }

  private static DMatrixRMaj gram(DMatrixRMaj a) {
    DMatrixRMaj result = new DMatrixRMaj(a.numCols, a.numCols);
    CommonOps_DDRM.multTransA(a, a, result);
    return result;
  }

  @ParameterizedTest
  @CsvSource({"1, 1", "2, 1", "3, 3", "4, 3", "5, 4", "9, 4", "21, 20"})
  void normalMatrixIsKept(int rows, int reduced) {
    for (int seed = 0; seed < 20; seed++) {
      DMatrixRMaj a = new RandomGaussians(seed).matrix(rows, reduced);
      DMatrixRMaj r = triangle(a, reduced);
      assertMatrix("R'R", gram(a), gram(r), ROUNDING, rows);
    }
  }

  /** Other columns are turned: their lengths stay, and their products with the reduced ones. */
  @ParameterizedTest
  @CsvSource({"4, 3", "6, 2", "8, 5"})
  void otherColumnsAreTurned(int rows, int reduced) {
    for (int seed = 0; seed < 20; seed++) {
      DMatrixRMaj a = new RandomGaussians(100 + seed).matrix(rows, reduced + 2);
      DMatrixRMaj turned = a.copy();
      Householder.triangularise(turned.data, rows, reduced + 2, reduced);
      for (int i = 0; i < rows; i++) {
        for (int j = 0; j < Math.min(i, reduced); j++) {
          turned.set(i, j, 0);
        }
      }
      assertMatrix("A'A, all columns", gram(a), gram(turned), ROUNDING, rows);
    }
  }

  /** EJML's triangle, up to the signs of its rows. */
  @ParameterizedTest
  @CsvSource({"3, 3", "4, 3", "9, 4", "21, 20"})
  void triangleIsThatOfTheLibrary(int rows, int columns) {
    for (int seed = 0; seed < 20; seed++) {
      DMatrixRMaj a = new RandomGaussians(200 + seed).matrix(rows, columns);
      QRDecomposition<DMatrixRMaj> other = DecompositionFactory_DDRM.qr(rows, columns);
      assertTrue(other.decompose(a.copy()));
      DMatrixRMaj wanted = other.getR(null, true);
      DMatrixRMaj got = triangle(a, columns);
      positiveDiagonal(wanted);
      positiveDiagonal(got);
      // 1e-11: rows of R, unlike R'R, carry the condition of the leading columns, a few hundred.
      assertMatrix("R", wanted, got, 1e-11, rows);
    }
  }

  private static void positiveDiagonal(DMatrixRMaj r) {
    for (int i = 0; i < r.numRows; i++) {
      double sign = r.get(i, i) < 0 ? -1 : 1;
      for (int j = 0; j < r.numCols; j++) {
        r.set(i, j, sign * r.get(i, j));
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"0", "1", "2"})
  void aColumnOfZerosGivesAZeroOnTheDiagonal(int zero) {
    DMatrixRMaj a = new RandomGaussians(5).matrix(4, 4);
    for (int i = 0; i < 4; i++) {
      a.set(i, zero, 0);
    }
    DMatrixRMaj r = triangle(a, 3);
    assertEquals(0.0, Math.abs(r.get(zero, zero)));
    assertMatrix("R'R", gram(leading(a, 3)), gram(r), ROUNDING, 4);
  }

  /** By hand: [[3], [4]] has length 5, and reflecting [1, 2] keeps (3 + 8) / 5 along it. */
  @ParameterizedTest
  @CsvSource({"1", "-1"})
  void aColumnOfWholeNumbers(int sign) {
    double[] a = {3 * sign, 1, 4 * sign, 2};
    Householder.triangularise(a, 2, 2, 1);
    assertWithin("length", 5, Math.abs(a[0]), 1e-15, 5);
    assertWithin("along", 11.0 / 5, Math.abs(a[1]), 1e-15, 3);
    assertWithin("across", 2.0 / 5, Math.abs(a[3]), 1e-15, 3);
    assertEquals(Math.signum(a[0]) * sign, Math.signum(a[1]), "same side");
  }
}

package dev.estimation.core.internal;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Reductions of random matrices. 1e-13 throughout: a few dozen roundings on entries of order 1. */
class HouseholderTest {
  private static final double ROUNDING = 1e-13;

  private static DMatrixRMaj lower(int rows, int reduced, RandomGaussians random) {
    DMatrixRMaj l = random.matrix(rows, reduced);
    for (int i = 0; i < reduced; i++) {
      for (int j = i; j < reduced; j++) {
        l.set(i, j, i == j ? Math.abs(l.get(i, j)) : 0);
      }
    }
    return l;
  }

  /** Upper triangular in the first rows: a lower triangle with rows and columns taken backwards. */
  private static DMatrixRMaj upper(int rows, int reduced, RandomGaussians random) {
    DMatrixRMaj u = random.matrix(rows, reduced);
    for (int i = 0; i < reduced; i++) {
      for (int j = 0; j <= i; j++) {
        u.set(i, j, i == j ? Math.abs(u.get(i, j)) : 0);
      }
    }
    return u;
  }

  /** T T' + A A'. */
  private static DMatrixRMaj square(DMatrixRMaj t, DMatrixRMaj a) {
    DMatrixRMaj sum = new DMatrixRMaj(t.numRows, t.numRows);
    CommonOps_DDRM.multTransB(t, t, sum);
    CommonOps_DDRM.multAddTransB(a, a, sum);
    return sum;
  }

  private static void assertTriangle(DMatrixRMaj t, int reduced, boolean isLower) {
    for (int i = 0; i < reduced; i++) {
      assertTrue(t.get(i, i) >= 0, "diagonal");
      for (int j = 0; j < reduced; j++) {
        boolean outside = isLower ? j > i : j < i;
        assertTrue(!outside || t.get(i, j) == 0, "outside the triangle");
      }
    }
  }

  /** T' has the square of [T A], and the other rows keep their lengths and products with the first. */
  @ParameterizedTest
  @CsvSource({"1, 1, 1", "2, 2, 5", "3, 3, 1", "4, 3, 2", "6, 4, 9", "7, 7, 40", "5, 5, 3"})
  void squareIsKept(int rows, int reduced, int columns) {
    for (int seed = 0; seed < 20; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      for (boolean isLower : new boolean[] {true, false}) {
        DMatrixRMaj t = isLower ? lower(rows, reduced, random) : upper(rows, reduced, random);
        DMatrixRMaj a = random.matrix(rows, columns);
        DMatrixRMaj wanted = square(t, a);
        reduce(isLower, t, a, reduced);
        assertTriangle(t, reduced, isLower);
        for (int i = 0; i < reduced; i++) {
          for (int j = 0; j < columns; j++) {
            a.set(i, j, 0); // scratch, zero in exact arithmetic
          }
        }
        assertMatrix("square", wanted, square(t, a), ROUNDING, 10 * columns);
      }
    }
  }

  private static void reduce(boolean isLower, DMatrixRMaj t, DMatrixRMaj a, int reduced) {
    if (isLower) {
      Householder.reduceLower(t.data, reduced, a.data, t.numRows, a.numCols);
    } else {
      Householder.reduceUpper(t.data, reduced, a.data, t.numRows, a.numCols);
    }
  }

  /** By hand: (3, 4) has length 5, and (1, 2) turned with it keeps 11 / 5 along it and 2 / 5 across. */
  @Test
  void aRowOfWholeNumbers() {
    double[] t = {3, 1};
    double[] a = {4, 2};
    Householder.reduceLower(t, 1, a, 2, 1);
    assertWithin("length", 5, t[0], 1e-15, 5);
    assertWithin("along", 11.0 / 5, t[1], 1e-15, 3);
    assertWithin("across", 2.0 / 5, Math.abs(a[1]), 1e-15, 3);
  }

  @Test
  void rowsOfZerosChangeNothing() {
    double[] t = {2, 0, -1, 3};
    double[] a = new double[6];
    Householder.reduceLower(t, 2, a, 2, 3);
    assertEquals(2, t[0]);
    assertEquals(-1, t[2]);
    assertEquals(3, t[3]);
  }

  @Test
  void notANumberIsNotHidden() {
    double[] t = {1, 0, 0, 1};
    Householder.reduceLower(t, 2, new double[] {Double.NaN, 0}, 2, 1);
    assertTrue(Double.isNaN(t[0]));
  }

  /** Adding a column by reduction and taking it off again; 1e-12: what is left is a tenth of the whole. */
  @ParameterizedTest
  @CsvSource({"1", "2", "5", "9"})
  void downdateUndoesReduction(int n) {
    for (int seed = 0; seed < 20; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      DMatrixRMaj l = lower(n, n, random);
      for (int i = 0; i < n; i++) {
        l.add(i, i, 1);
      }
      DMatrixRMaj more = l.copy();
      double[] v = random.vector(n);
      Householder.reduceLower(more.data, n, v.clone(), n, 1);
      assertTrue(Householder.downdate(more.data, n, v));
      assertMatrix("L", l, more, 1e-12, 10);
    }
  }

  @Test
  void downdateSaysWhenNothingIsLeft() {
    double[] l = {1, 0, 0.5, 1};
    assertFalse(Householder.downdate(l, 2, new double[] {0, 1.0}));
    assertTrue(Double.isNaN(l[3]));
    assertFalse(Householder.downdate(new double[] {1}, 1, new double[] {Double.NaN}));
  }
}

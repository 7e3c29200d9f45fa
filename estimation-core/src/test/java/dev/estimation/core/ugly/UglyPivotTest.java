package dev.estimation.core.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import dev.estimation.core.internal.LowerFactor;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * A small pivot magnifies its rounding in later ones; that must not excuse what is plainly
 * negative.
 */
class UglyPivotTest {
  private static DMatrixRMaj afterASmallPivot(int unitsOfRounding) {
    double d = unitsOfRounding * 0x1p-52;
    double b = 1.2 * Math.sqrt(d);
    return new DMatrixRMaj(new double[][] {{1, 1, 0}, {1, 1 + d, b}, {0, b, 1}});
  }

  /** The last pivot is 1 - b^2 / d = -0.44; 1e-12: d itself is exact, the rest a few roundings. */
  @ParameterizedTest
  @ValueSource(ints = {8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18})
  void aNegativePivotAfterASmallOneIsRefused(int unitsOfRounding) {
    LowerFactor factor = new LowerFactor(3);
    assertFalse(factor.factorSemidefinite(afterASmallPivot(unitsOfRounding)));
    assertEquals(2, factor.failedPivot());
    assertWithin("pivot", -0.44, factor.failedValue(), 1e-12, 1);
    assertNames(factor.failure(), "pivot 3 of 3 is -0.4");
  }
}

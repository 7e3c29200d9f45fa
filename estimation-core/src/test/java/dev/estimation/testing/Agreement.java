package dev.estimation.testing;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.ejml.data.DMatrixRMaj;

/** Comparisons in which the caller states the tolerance and what it is relative to. */
public final class Agreement {
  private Agreement() {}

  /** |actual - expected| must not be above {@code tolerance * scale}; NaN fails. */
  public static void assertWithin(
      String what, double expected, double actual, double tolerance, double scale) {
    double error = Math.abs(actual - expected);
    assertTrue(
        error <= tolerance * scale,
        () -> what + ": wanted " + expected + ", got " + actual + ", error " + error + " above "
            + tolerance + " x " + scale);
  }

  /** Relative to the expected value itself. */
  public static void assertRelative(String what, double expected, double actual, double tolerance) {
    assertWithin(what, expected, actual, tolerance, Math.abs(expected));
  }

  /** Component by component, with one scale for all. */
  public static void assertVector(
      String what, double[] expected, double[] actual, double tolerance, double scale) {
    assertEquals(expected.length, actual.length, what + ": length");
    for (int i = 0; i < expected.length; i++) {
      assertWithin(what + "[" + i + "]", expected[i], actual[i], tolerance, scale);
    }
  }

  /** Entry by entry, with one scale for all. */
  public static void assertMatrix(
      String what, DMatrixRMaj expected, DMatrixRMaj actual, double tolerance, double scale) {
    assertShape(what, expected, actual);
    for (int i = 0; i < expected.numRows; i++) {
      for (int j = 0; j < expected.numCols; j++) {
        String entry = what + "[" + i + "][" + j + "]";
        assertWithin(entry, expected.get(i, j), actual.get(i, j), tolerance, scale);
      }
    }
  }

  /** Covariances, each entry relative to sqrt(p_ii p_jj) of the expected one. */
  public static void assertCovariance(
      String what, DMatrixRMaj expected, DMatrixRMaj actual, double tolerance) {
    assertShape(what, expected, actual);
    for (int i = 0; i < expected.numRows; i++) {
      for (int j = 0; j < expected.numCols; j++) {
        double scale = Math.sqrt(expected.get(i, i)) * Math.sqrt(expected.get(j, j));
        String entry = what + "[" + i + "][" + j + "]";
        assertWithin(entry, expected.get(i, j), actual.get(i, j), tolerance, scale);
      }
    }
  }

  private static void assertShape(String what, DMatrixRMaj expected, DMatrixRMaj actual) {
    assertEquals(expected.numRows, actual.numRows, what + ": rows");
    assertEquals(expected.numCols, actual.numCols, what + ": columns");
  }

  /** Every number the same, bit for bit, the sign of zero and the kind of NaN included. */
  public static void assertSameBits(String what, double[] expected, double[] actual) {
    assertEquals(expected.length, actual.length, what + ": length");
    for (int i = 0; i < expected.length; i++) {
      int index = i;
      assertEquals(
          Double.doubleToRawLongBits(expected[i]),
          Double.doubleToRawLongBits(actual[i]),
          () -> what + "[" + index + "]: " + expected[index] + " became " + actual[index]);
    }
  }

  /** Every entry the same, bit for bit. */
  public static void assertSameBits(String what, DMatrixRMaj expected, DMatrixRMaj actual) {
    assertShape(what, expected, actual);
    assertSameBits(what, entries(expected), entries(actual));
  }

  private static double[] entries(DMatrixRMaj matrix) {
    return java.util.Arrays.copyOf(matrix.data, matrix.getNumElements());
  }

  /** The largest absolute entry. */
  public static double largest(double... values) {
    double result = 0;
    for (double value : values) {
      result = Math.max(result, Math.abs(value));
    }
    return result;
  }

  /** Every named fragment must stand in the message. */
  public static void assertNames(String message, String... fragments) {
    for (String fragment : fragments) {
      assertTrue(
          message != null && message.contains(fragment),
          () -> "\"" + fragment + "\" must stand in the message: " + message);
    }
  }
}

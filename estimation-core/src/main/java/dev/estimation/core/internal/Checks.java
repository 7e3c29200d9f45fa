package dev.estimation.core.internal;

import java.util.Arrays;

/** Argument checks whose messages say what, wanted and got. */
public final class Checks {
  private Checks() {}

  /**
   * Fails unless {@code array} has {@code wanted} elements.
   *
   * @param what the name in the message
   * @param array checked
   * @param wanted its length
   */
  public static void length(String what, double[] array, int wanted) {
    if (array == null) {
      throw new NullPointerException(what + " must have length " + wanted + ", got null");
    }
    if (array.length != wanted) {
      throw new IllegalArgumentException(
          what + " must have length " + wanted + ", got " + array.length);
    }
  }

  /**
   * Fails unless every element is finite.
   *
   * @param what the name in the message
   * @param values checked
   */
  public static void finite(String what, double... values) {
    for (int i = 0; i < values.length; i++) {
      if (!Double.isFinite(values[i])) {
        String place = values.length == 1 ? "" : "[" + i + "]";
        throw new IllegalArgumentException(what + place + " must be finite, got " + values[i]);
      }
    }
  }

  /**
   * {@return whether every element is finite}
   *
   * @param values checked
   */
  public static boolean allFinite(double[] values) {
    return allFinite(values, values.length);
  }

  /**
   * Whether the first elements are finite. A finite number times zero is zero, any other is NaN: sums
   * of these need no branch.
   *
   * @param values checked
   * @param count how many
   * @return whether all are finite
   */
  public static boolean allFinite(double[] values, int count) {
    double zero = 0;
    for (int i = 0; i < count; i++) {
      zero += values[i] * 0;
    }
    return zero == 0;
  }

  /**
   * {@return the index of the first element that is not finite, or -1}
   *
   * @param values checked
   */
  public static int firstNotFinite(double[] values) {
    for (int i = 0; i < values.length; i++) {
      if (!Double.isFinite(values[i])) {
        return i;
      }
    }
    return -1;
  }

  /**
   * Fails unless the indices are distinct and each lies in [0, size).
   *
   * @param what the name in the message
   * @param indices checked
   * @param size the limit, exclusive
   */
  public static void distinctIndices(String what, int[] indices, int size) {
    boolean[] seen = new boolean[size];
    for (int index : indices) {
      if (index < 0 || index >= size || seen[index]) {
        throw new IllegalArgumentException(what + " must be distinct and in 0.." + (size - 1)
            + ", got " + Arrays.toString(indices));
      }
      seen[index] = true;
    }
  }
}

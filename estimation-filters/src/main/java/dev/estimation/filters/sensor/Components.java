package dev.estimation.filters.sensor;

import java.util.Arrays;
import java.util.stream.IntStream;

/**
 * Which numbers of the state a sensor reads: {@code Components.of(0, 1)} for a position that stands first.
 *
 * <p>Their order is that of the axes. A bearing is zero along the first component and grows towards the second: (x, y)
 * gives the angle of mathematics, (north, east) that of the compass.
 *
 * <p>Number i of the state has column i in a Jacobian, and index i among the active inputs, as long as all numbers before
 * it are reals and angles. A unit quaternion has four numbers and three columns: what stands behind one or more says so
 * by {@link #behindQuaternions}. <i>Immutable.</i>
 */
public final class Components {
  private final int[] indices;
  private final int quaternions;

  private Components(int[] indices, int quaternions) {
    this.indices = indices;
    this.quaternions = quaternions;
  }

  /**
   * {@return components of a state in which no quaternion stands before them}
   *
   * @param indices 1 or more, 0 or above, distinct; copied
   * @throws IllegalArgumentException if they are not
   */
  public static Components of(int... indices) {
    boolean distinct = IntStream.of(indices).distinct().count() == indices.length;
    if (indices.length == 0 || !distinct || IntStream.of(indices).anyMatch(i -> i < 0)) {
      throw new IllegalArgumentException(
          "components must be 1 or more distinct indices of 0 or above, got "
              + Arrays.toString(indices));
    }
    return new Components(indices.clone(), 0);
  }

  /**
   * {@return these components in a state in which unit quaternions stand before them}
   *
   * @param count of the quaternions before the first of these components, 0 or more
   * @throws IllegalArgumentException if there is no room for so many
   */
  public Components behindQuaternions(int count) {
    int first = IntStream.of(indices).min().orElseThrow();
    if (count < 0 || first / 4 < count) {
      throw new IllegalArgumentException("quaternions before components " + this
          + " must number 0 to " + first / 4 + ", got " + count);
    }
    return new Components(indices, count);
  }

  int count() {
    return indices.length;
  }

  /** The index among the numbers of the state. */
  int index(int axis) {
    return indices[axis];
  }

  int[] indices() {
    return indices.clone();
  }

  /** The index among differences of states. */
  int column(int axis) {
    return indices[axis] - quaternions;
  }

  int[] columns() {
    return IntStream.of(indices).map(index -> index - quaternions).toArray();
  }

  /** Fails unless there are so many. */
  void requireCount(int wanted, String what, String where) {
    if (indices.length != wanted) {
      throw new IllegalArgumentException(what + " must have " + wanted
          + (wanted == 1 ? " component" : " components") + ", got " + this + " (" + where + ")");
    }
  }

  @Override
  public String toString() {
    return Arrays.toString(indices);
  }
}

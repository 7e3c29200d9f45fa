package dev.estimation.core.space;

import java.util.Arrays;

/**
 * A vector whose components are real numbers and angles, in any order: {@code
 * Space.reals(1).and(Space.angles(1))} is a range and a bearing.
 *
 * <p>Differences and displacements are taken component by component; those of angles are wrapped to
 * [-pi, pi). Points given to it need not be wrapped. <i>Immutable.</i>
 */
public final class FlatSpace implements Space {
  private final boolean[] angle;
  private final boolean anyAngle;

  private FlatSpace(boolean[] angle) {
    this.angle = angle;
    boolean any = false;
    for (boolean one : angle) {
      any |= one;
    }
    this.anyAngle = any;
  }

  static FlatSpace reals(int count) {
    return new FlatSpace(new boolean[checked(count)]);
  }

  static FlatSpace angles(int count) {
    boolean[] angle = new boolean[checked(count)];
    Arrays.fill(angle, true);
    return new FlatSpace(angle);
  }

  private static int checked(int count) {
    if (count < 1) {
      throw new IllegalArgumentException("a space must have at least 1 component, got " + count);
    }
    return count;
  }

  /**
   * {@return the components of this space followed by those of another}
   *
   * @param next the components that follow
   */
  public FlatSpace and(FlatSpace next) {
    boolean[] joined = Arrays.copyOf(angle, angle.length + next.angle.length);
    System.arraycopy(next.angle, 0, joined, angle.length, next.angle.length);
    return new FlatSpace(joined);
  }

  /**
   * {@return whether component {@code index} is an angle}
   *
   * @param index from 0
   */
  public boolean isAngle(int index) {
    return angle[index];
  }

  @Override
  public boolean isVectorSpace() {
    return !anyAngle;
  }

  @Override
  public int storage() {
    return angle.length;
  }

  @Override
  public int dimension() {
    return angle.length;
  }

  @Override
  public void difference(double[] a, double[] b, double[] tangent) {
    difference(a, b, 0, tangent, 0);
  }

  @Override
  public void difference(
      double[] a, double[] b, int pointStart, double[] tangent, int tangentStart) {
    for (int i = 0; i < angle.length; i++) {
      double difference = a[pointStart + i] - b[pointStart + i];
      tangent[tangentStart + i] = angle[i] ? Angle.wrap(difference) : difference;
    }
  }

  @Override
  public void displace(double[] point, double[] tangent, double[] result) {
    displace(point, tangent, 0, result, 0);
  }

  @Override
  public void displace(
      double[] point, double[] tangent, int tangentStart, double[] result, int pointStart) {
    for (int i = 0; i < angle.length; i++) {
      double sum = point[pointStart + i] + tangent[tangentStart + i];
      result[pointStart + i] = angle[i] ? Angle.wrap(sum) : sum;
    }
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof FlatSpace that && Arrays.equals(angle, that.angle);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(angle);
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder("(");
    for (int i = 0; i < angle.length; i++) {
      text.append(i == 0 ? "" : ", ").append(angle[i] ? "angle" : "real");
    }
    return text.append(')').toString();
  }
}

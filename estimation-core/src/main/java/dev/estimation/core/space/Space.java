package dev.estimation.core.space;

/**
 * Where a vector lives: how far two points are apart and how to move from one by a given amount.
 *
 * <p>A point is an array of {@link #storage()} numbers; a difference of two points is an array of
 * {@link #dimension()} numbers, the size of every covariance, Jacobian row and active-input index.
 * The two sizes are equal for reals and angles.
 *
 * <p>For all points a and b, {@code displace(b, difference(a, b))} is a. NaN and infinity pass
 * through as NaN or infinity; nothing is thrown for them.
 *
 * <p>Implementations are <i>immutable</i>, keep no array and allocate nothing in their operations.
 */
public interface Space {
  /** {@return how many numbers a point has} */
  int storage();

  /** {@return how many numbers a difference of two points has} */
  int dimension();

  /**
   * The difference a - b, as seen from b.
   *
   * @param a read
   * @param b read
   * @param tangent filled; may be the same array as {@code a} or {@code b} where storage and
   *     dimension are equal
   */
  void difference(double[] a, double[] b, double[] tangent);

  /**
   * The point reached from {@code point} by {@code tangent}.
   *
   * @param point read
   * @param tangent read
   * @param result filled; may be the same array as {@code point}
   */
  void displace(double[] point, double[] tangent, double[] result);

  /**
   * {@return the space of {@code count} real numbers}
   *
   * @param count 1 or more
   */
  static FlatSpace reals(int count) {
    return FlatSpace.reals(count);
  }

  /**
   * {@return the space of {@code count} angles (rad), each kept in [-pi, pi)}
   *
   * @param count 1 or more
   */
  static FlatSpace angles(int count) {
    return FlatSpace.angles(count);
  }
}

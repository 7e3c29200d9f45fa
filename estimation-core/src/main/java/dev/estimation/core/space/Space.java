package dev.estimation.core.space;

import java.util.Arrays;

/**
 * Where a vector lives: how far two points are apart and how to move from one by a given amount.
 *
 * <p>A point is an array of {@link #storage()} numbers; a difference of two points is an array of
 * {@link #dimension()} numbers, the size of every covariance, Jacobian row and active-input index.
 * The two sizes are equal for reals and angles; a unit quaternion has four numbers and differs by three.
 *
 * <p>For all points a and b, {@code displace(b, difference(a, b))} is a. NaN and infinity pass
 * through as NaN or infinity; nothing is thrown for them.
 *
 * <p>Implementations are <i>immutable</i>, keep no array and allocate nothing in their operations. Whoever
 * writes one also writes {@code equals}: an estimate is refused by a plan whose space is not equal.
 */
public interface Space {
  /** {@return how many numbers a point has} */
  int storage();

  /** {@return how many numbers a difference of two points has} */
  int dimension();

  /**
   * {@return whether differences and displacements are those of the components, as they are for real numbers;
   * then they need not be asked for}
   */
  default boolean isVectorSpace() {
    return false;
  }

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
   * The difference of parts of longer arrays: what a product asks of its factors. Copies the parts
   * unless it is overridden; then a product with this space allocates in its operations.
   *
   * @param a read
   * @param b read
   * @param pointStart where the part begins in {@code a} and {@code b}
   * @param tangent filled in {@link #dimension()} places
   * @param tangentStart where the part begins in {@code tangent}
   */
  default void difference(
      double[] a, double[] b, int pointStart, double[] tangent, int tangentStart) {
    double[] part = new double[dimension()];
    difference(
        Arrays.copyOfRange(a, pointStart, pointStart + storage()),
        Arrays.copyOfRange(b, pointStart, pointStart + storage()),
        part);
    System.arraycopy(part, 0, tangent, tangentStart, part.length);
  }

  /**
   * The displacement of a part of a longer array: what a product asks of its factors. Copies the
   * part unless it is overridden; then a product with this space allocates in its operations.
   *
   * @param point read
   * @param tangent read
   * @param tangentStart where the part begins in {@code tangent}
   * @param result filled in {@link #storage()} places; may be the same array as {@code point}
   * @param pointStart where the part begins in {@code point} and {@code result}
   */
  default void displace(
      double[] point, double[] tangent, int tangentStart, double[] result, int pointStart) {
    double[] part = new double[storage()];
    displace(
        Arrays.copyOfRange(point, pointStart, pointStart + storage()),
        Arrays.copyOfRange(tangent, tangentStart, tangentStart + dimension()),
        part);
    System.arraycopy(part, 0, result, pointStart, part.length);
  }

  /**
   * Whether an array can be taken for a point: its length is {@link #storage()}, its numbers are finite,
   * and no more is wrong with it than a displacement by zero mends.
   *
   * @param point read
   * @return whether it can
   */
  default boolean contains(double[] point) {
    return point.length == storage() && contains(point, 0);
  }

  /**
   * Whether a part of a longer array can be taken for a point.
   *
   * @param point read
   * @param start where the part begins
   * @return whether it can
   */
  default boolean contains(double[] point, int start) {
    for (int i = 0; i < storage(); i++) {
      if (!Double.isFinite(point[start + i])) {
        return false;
      }
    }
    return true;
  }

  /**
   * The product of this space and another: points, and differences, one after the other. Reals and
   * angles that meet become one {@link FlatSpace}, so that {@code a.and(b).and(c)} equals {@code
   * a.and(b.and(c))}.
   *
   * @param next what follows
   * @return the product
   */
  default Space and(Space next) {
    return ProductSpace.of(this, next);
  }

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

  /**
   * The space of unit quaternions (w, x, y, z), that is of rotations. With q * p the product of Hamilton
   * and exp(v) = (cos(|v| / 2), sin(|v| / 2) v / |v|) the rotation about v by |v| rad:
   *
   * <ul>
   *   <li>storage 4, dimension 3; a difference is a rotation vector (rad) in the turned frame (the
   *       body's, if q turns vectors of the body into those of the world);
   *   <li>displace(q, v) = q * exp(v), divided by its length;
   *   <li>difference(a, b) = log(b^-1 * a), with log(w, u) = 2 atan2(|u|, w) u / |u| and the sign that
   *       makes w &gt;= 0: the shortest way, at most pi long. q and -q are the same rotation.
   * </ul>
   *
   * <p>Points need not have length 1 in these operations, from 1e-70 to 1e70; zero gives NaN. {@link
   * #contains(double[])} accepts lengths within 1e-3 of 1, which quaternions printed with four decimals
   * have. Accuracy: a few 1e-16 rad, and relative to the rotation vector from 1e-300 rad to pi if the other
   * rotation is none. At pi both signs of a difference are right; either may come. Displacements of
   * 1e155 rad and more give NaN. A difference is continuous but for rotations by pi; a spread of more than
   * about 1 rad begins to notice that.
   *
   * <p>Cost: about 40 operations and a sine and cosine, or an arc tangent. Source: Sola 2017,
   * <i>Quaternion kinematics for the error-state Kalman filter</i>, sections 1 to 4 (from memory).
   *
   * @return the space
   */
  static Space unitQuaternion() {
    return QuaternionSpace.INSTANCE;
  }
}

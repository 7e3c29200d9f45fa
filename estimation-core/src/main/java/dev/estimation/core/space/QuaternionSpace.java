package dev.estimation.core.space;

/** Unit quaternions (w, x, y, z); see {@link Space#unitQuaternion()} for the formulas. Immutable. */
final class QuaternionSpace implements Space {
  static final QuaternionSpace INSTANCE = new QuaternionSpace();

  /** Below this square of an argument, two terms of a series are right to 2e-17. */
  private static final double SMALL = 1e-8;

  /** How far a length may be from 1 in what is given. */
  private static final double LENGTH_TOLERANCE = 1e-3;

  /** A division by the length leaves its square within 12 roundings of 1, that is 3 / 4 of this. */
  private static final double ROUNDING = 0x1p-49;

  private QuaternionSpace() {}

  @Override
  public int storage() {
    return 4;
  }

  @Override
  public int dimension() {
    return 3;
  }

  @Override
  public void difference(double[] a, double[] b, double[] tangent) {
    difference(a, b, 0, tangent, 0);
  }

  /** With (w, u) = b^-1 * a: 2 atan(|u| / w) u / |u|, for w of any sign; no length matters. */
  @Override
  public void difference(double[] a, double[] b, int at, double[] tangent, int to) {
    double aw = a[at];
    double ax = a[at + 1];
    double ay = a[at + 2];
    double az = a[at + 3];
    double bw = b[at];
    double bx = b[at + 1];
    double by = b[at + 2];
    double bz = b[at + 3];
    double w = bw * aw + bx * ax + by * ay + bz * az;
    // Grouped so that every bracket is exactly zero for a = b.
    double x = (bw * ax - bx * aw) - (by * az - bz * ay);
    double y = (bw * ay - by * aw) - (bz * ax - bx * az);
    double z = (bw * az - bz * aw) - (bx * ay - by * ax);
    double factor = logarithm(w, x * x + y * y + z * z);
    tangent[to] = factor * x;
    tangent[to + 1] = factor * y;
    tangent[to + 2] = factor * z;
  }

  /** 2 atan(s / w) / s, from w and s^2. */
  private static double logarithm(double w, double squared) {
    if (squared < SMALL * w * w) {
      return 2 / w * (1 - squared / (3 * w * w));
    }
    double s = Math.sqrt(squared);
    double half = Math.atan2(s, Math.abs(w)) / s;
    return w < 0 ? -2 * half : 2 * half;
  }

  @Override
  public void displace(double[] point, double[] tangent, double[] result) {
    displace(point, tangent, 0, result, 0);
  }

  @Override
  public void displace(double[] point, double[] tangent, int from, double[] result, int at) {
    double x = tangent[from];
    double y = tangent[from + 1];
    double z = tangent[from + 2];
    double squared = x * x + y * y + z * z;
    double half = 0.5 * Math.sqrt(squared);
    double factor = squared < SMALL ? 0.5 - squared / 48 : 0.5 * Math.sin(half) / half;
    turn(point, Math.cos(half), factor * x, factor * y, factor * z, result, at);
  }

  /** point * (w, x, y, z), with length 1. */
  private static void turn(
      double[] point, double w, double x, double y, double z, double[] result, int at) {
    double pw = point[at];
    double px = point[at + 1];
    double py = point[at + 2];
    double pz = point[at + 3];
    result[at] = pw * w - px * x - py * y - pz * z;
    result[at + 1] = pw * x + px * w + py * z - pz * y;
    result[at + 2] = pw * y + py * w + pz * x - px * z;
    result[at + 3] = pw * z + pz * w + px * y - py * x;
    normalise(result, at);
  }

  /** What has length 1 already is left as it is, so that bits survive a displacement by zero. */
  private static void normalise(double[] q, int at) {
    double squared = lengthSquared(q, at);
    if (Math.abs(squared - 1) <= ROUNDING) {
      return;
    }
    double length = Math.sqrt(squared);
    for (int i = at; i < at + 4; i++) {
      q[i] /= length;
    }
  }

  private static double lengthSquared(double[] q, int at) {
    return q[at] * q[at] + q[at + 1] * q[at + 1] + q[at + 2] * q[at + 2] + q[at + 3] * q[at + 3];
  }

  @Override
  public boolean contains(double[] point, int start) {
    double length = Math.sqrt(lengthSquared(point, start));
    return Math.abs(length - 1) <= LENGTH_TOLERANCE;
  }

  @Override
  public String toString() {
    return "(unit quaternion)";
  }
}

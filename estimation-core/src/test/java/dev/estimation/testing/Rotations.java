package dev.estimation.testing;

import java.util.SplittableRandom;
import org.ejml.data.DMatrixRMaj;

/** Unit quaternions (w, x, y, z), written out apart from the library. */
public final class Rotations {
  private Rotations() {}

  /** A unit quaternion, uniform over all rotations. */
  public static double[] random(SplittableRandom random) {
    double[] q = new double[4];
    double length = 0;
    for (int i = 0; i < 4; i++) {
      q[i] = random.nextGaussian();
      length = Math.hypot(length, q[i]);
    }
    for (int i = 0; i < 4; i++) {
      q[i] /= length;
    }
    return q;
  }

  /** A rotation vector of random direction, up to a length. */
  public static double[] vector(SplittableRandom random, double longest) {
    double[] v = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
    double scale = random.nextDouble() * longest / Math.hypot(Math.hypot(v[0], v[1]), v[2]);
    return new double[] {scale * v[0], scale * v[1], scale * v[2]};
  }

  /** The rotation by some degrees about an axis of length 1. */
  public static double[] about(double degrees, double x, double y, double z) {
    double half = Math.toRadians(degrees) / 2;
    double sine = Math.sin(half);
    return new double[] {Math.cos(half), sine * x, sine * y, sine * z};
  }

  /** The product of Hamilton. */
  public static double[] product(double[] a, double[] b) {
    return new double[] {
      a[0] * b[0] - a[1] * b[1] - a[2] * b[2] - a[3] * b[3],
      a[0] * b[1] + a[1] * b[0] + a[2] * b[3] - a[3] * b[2],
      a[0] * b[2] - a[1] * b[3] + a[2] * b[0] + a[3] * b[1],
      a[0] * b[3] + a[1] * b[2] - a[2] * b[1] + a[3] * b[0]
    };
  }

  /** R with R u the turned vector: the columns are the turned axes. */
  public static DMatrixRMaj matrix(double[] q) {
    double w = q[0];
    double x = q[1];
    double y = q[2];
    double z = q[3];
    return new DMatrixRMaj(new double[][] {
      {w * w + x * x - y * y - z * z, 2 * (x * y - w * z), 2 * (x * z + w * y)},
      {2 * (x * y + w * z), w * w - x * x + y * y - z * z, 2 * (y * z - w * x)},
      {2 * (x * z - w * y), 2 * (y * z + w * x), w * w - x * x - y * y + z * z}
    });
  }
}

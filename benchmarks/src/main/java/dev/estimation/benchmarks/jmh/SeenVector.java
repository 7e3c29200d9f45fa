package dev.estimation.benchmarks.jmh;

/**
 * A vector of the world as a turned body sees it: h = R(q)'(0.6, 0, 0.8), q a unit quaternion (w, x, y, z) from body to
 * world. By a turn of the body its derivative is the matrix of the cross product with h.
 */
final class SeenVector implements SmallFunction {
  private static final double EAST = 0.6;
  private static final double UP = 0.8;

  @Override
  public int inputs() {
    return 3;
  }

  @Override
  public int outputs() {
    return 3;
  }

  @Override
  public int[] linearInputs() {
    return new int[0];
  }

  @Override
  public void fill(double[] q, double[] h) {
    h[0] = (1 - 2 * (q[2] * q[2] + q[3] * q[3])) * EAST + 2 * (q[1] * q[3] - q[0] * q[2]) * UP;
    h[1] = 2 * (q[1] * q[2] - q[0] * q[3]) * EAST + 2 * (q[2] * q[3] + q[0] * q[1]) * UP;
    h[2] = 2 * (q[1] * q[3] + q[0] * q[2]) * EAST + (1 - 2 * (q[1] * q[1] + q[2] * q[2])) * UP;
  }

  /** With h in its first three places to begin with. */
  @Override
  public void fillJacobian(double[] q, double[] jacobian) {
    fill(q, jacobian);
    double x = jacobian[0];
    double y = jacobian[1];
    double z = jacobian[2];
    jacobian[0] = 0;
    jacobian[1] = -z;
    jacobian[2] = y;
    jacobian[3] = z;
    jacobian[5] = -x;
    jacobian[6] = -y;
    jacobian[7] = x;
  }
}

package dev.estimation.benchmarks.jmh;

/** Range (m) and bearing (rad) to a place in the plane. */
final class PolarPoint implements SmallFunction {
  @Override
  public int inputs() {
    return 2;
  }

  @Override
  public int outputs() {
    return 2;
  }

  @Override
  public int[] linearInputs() {
    return new int[] {0};
  }

  @Override
  public void fill(double[] u, double[] z) {
    z[0] = u[0] * Math.cos(u[1]);
    z[1] = u[0] * Math.sin(u[1]);
  }

  @Override
  public void fillJacobian(double[] u, double[] jacobian) {
    double cos = Math.cos(u[1]);
    double sin = Math.sin(u[1]);
    jacobian[0] = cos;
    jacobian[1] = -u[0] * sin;
    jacobian[2] = sin;
    jacobian[3] = u[0] * cos;
  }
}

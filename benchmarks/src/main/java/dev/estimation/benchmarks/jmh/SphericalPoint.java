package dev.estimation.benchmarks.jmh;

/** Range (m), azimuth and elevation (rad) to a place in space. */
final class SphericalPoint implements SmallFunction {
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
    return new int[] {0};
  }

  @Override
  public void fill(double[] u, double[] z) {
    double level = u[0] * Math.cos(u[2]);
    z[0] = level * Math.cos(u[1]);
    z[1] = level * Math.sin(u[1]);
    z[2] = u[0] * Math.sin(u[2]);
  }

  @Override
  public void fillJacobian(double[] u, double[] jacobian) {
    double cosAzimuth = Math.cos(u[1]);
    double sinAzimuth = Math.sin(u[1]);
    double cos = Math.cos(u[2]);
    double sin = Math.sin(u[2]);
    jacobian[0] = cos * cosAzimuth;
    jacobian[1] = -u[0] * cos * sinAzimuth;
    jacobian[2] = -u[0] * sin * cosAzimuth;
    jacobian[3] = cos * sinAzimuth;
    jacobian[4] = u[0] * cos * cosAzimuth;
    jacobian[5] = -u[0] * sin * sinAzimuth;
    jacobian[6] = sin;
    jacobian[8] = u[0] * cos;
  }
}

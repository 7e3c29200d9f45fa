package dev.estimation.benchmarks.jmh;

/** A pseudorange (m): the distance of a place (x, y, z) from a satellite that stands still, and a clock's offset. */
final class RangeWithClock implements SmallFunction {
  private static final double X = 12e6;
  private static final double Y = 9e6;
  private static final double Z = 14e6;

  @Override
  public int inputs() {
    return 4;
  }

  @Override
  public int outputs() {
    return 1;
  }

  @Override
  public int[] linearInputs() {
    return new int[] {3};
  }

  @Override
  public void fill(double[] u, double[] z) {
    z[0] = distance(u) + u[3];
  }

  @Override
  public void fillJacobian(double[] u, double[] jacobian) {
    double distance = distance(u);
    jacobian[0] = (u[0] - X) / distance;
    jacobian[1] = (u[1] - Y) / distance;
    jacobian[2] = (u[2] - Z) / distance;
    jacobian[3] = 1;
  }

  private static double distance(double[] u) {
    double x = u[0] - X;
    double y = u[1] - Y;
    double z = u[2] - Z;
    return Math.sqrt(x * x + y * y + z * z);
  }
}

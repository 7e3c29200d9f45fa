package dev.estimation.benchmarks.jmh;

/**
 * A smooth function of all n inputs, n outputs, n sines: z_i = u_i + 0.3 sin(u_i + u_(i+1)), the last with the first.
 */
final class CoupledWaves implements SmallFunction {
  private static final double HEIGHT = 0.3;

  private final int n;

  CoupledWaves(int n) {
    this.n = n;
  }

  @Override
  public int inputs() {
    return n;
  }

  @Override
  public int outputs() {
    return n;
  }

  @Override
  public int[] linearInputs() {
    return new int[0];
  }

  @Override
  public void fill(double[] u, double[] z) {
    for (int i = 0; i < n; i++) {
      z[i] = u[i] + HEIGHT * Math.sin(u[i] + u[after(i)]);
    }
  }

  @Override
  public void fillJacobian(double[] u, double[] jacobian) {
    for (int i = 0; i < n; i++) {
      double slope = HEIGHT * Math.cos(u[i] + u[after(i)]);
      jacobian[i * n + i] = 1 + slope;
      jacobian[i * n + after(i)] = slope;
    }
  }

  private int after(int i) {
    return i + 1 == n ? 0 : i + 1;
  }
}

package dev.estimation.benchmarks.jmh;

/** A coordinated turn over 1 s; see {@link Turn}. */
final class TurnMove implements SmallFunction {
  private final Turn turn = new Turn();
  private final double[] nothing = new double[0];

  @Override
  public int inputs() {
    return 5;
  }

  @Override
  public int outputs() {
    return 5;
  }

  @Override
  public int[] linearInputs() {
    return turn.structure().linearInputs();
  }

  @Override
  public void fill(double[] u, double[] z) {
    turn.move(u, nothing, 0, 1, z);
  }

  @Override
  public void fillJacobian(double[] u, double[] jacobian) {
    turn.moveJacobian(u, nothing, 0, 1, jacobian);
  }
}

package dev.estimation.benchmarks.jmh;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/**
 * A coordinated turn, written as plainly as in a textbook: state (x, y, vx, vy, turn rate), process noise
 * diag(0.1, 0.1, 0.1, 0.1, 1e-6) whatever the time.
 */
final class Turn implements DifferentiableMotion {
  private static final double STRAIGHT = 1e-9;

  private final Space space = Space.reals(5);
  private final Structure structure = Structure.UNKNOWN.withLinearInputs(0, 1, 2, 3);

  @Override
  public Space stateSpace() {
    return space;
  }

  /** Linear in all but the turn rate. */
  @Override
  public Structure structure() {
    return structure;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    double rate = state[4];
    double sin = Math.sin(rate * dt);
    double cos = Math.cos(rate * dt);
    boolean straight = Math.abs(rate) < STRAIGHT;
    double along = straight ? dt : sin / rate;
    double across = straight ? 0 : (1 - cos) / rate;
    next[0] = state[0] + along * state[2] - across * state[3];
    next[1] = state[1] + across * state[2] + along * state[3];
    next[2] = cos * state[2] - sin * state[3];
    next[3] = sin * state[2] + cos * state[3];
    next[4] = rate;
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    double rate = state[4];
    double sin = Math.sin(rate * dt);
    double cos = Math.cos(rate * dt);
    boolean straight = Math.abs(rate) < STRAIGHT;
    double along = straight ? dt : sin / rate;
    double across = straight ? 0 : (1 - cos) / rate;
    double alongByRate = straight ? 0 : (dt * cos - along) / rate;
    double acrossByRate = straight ? dt * dt / 2 : (dt * sin - across) / rate;
    fillRow(jacobian, 0, along, -across, alongByRate * state[2] - acrossByRate * state[3]);
    fillRow(jacobian, 1, across, along, acrossByRate * state[2] + alongByRate * state[3]);
    fillRow(jacobian, 2, cos, -sin, -dt * (sin * state[2] + cos * state[3]));
    fillRow(jacobian, 3, sin, cos, dt * (cos * state[2] - sin * state[3]));
    jacobian[0] = 1;
    jacobian[6] = 1;
    jacobian[24] = 1;
  }

  private static void fillRow(double[] jacobian, int row, double byVx, double byVy, double byRate) {
    jacobian[5 * row + 2] = byVx;
    jacobian[5 * row + 3] = byVy;
    jacobian[5 * row + 4] = byRate;
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    for (int i = 0; i < 4; i++) {
      covariance[6 * i] = 0.1;
    }
    covariance[24] = 1e-6;
  }
}

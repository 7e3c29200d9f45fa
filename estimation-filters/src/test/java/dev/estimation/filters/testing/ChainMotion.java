package dev.estimation.filters.testing;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;

/** A ring of n components, each decaying and pulled by the sine of the next: nonlinear, stable, in any dimension. */
public final class ChainMotion implements DifferentiableMotion {
  private final int n;
  private final Space space;

  /** A ring of n components. */
  public ChainMotion(int n) {
    this.n = n;
    this.space = Space.reals(n);
  }

  @Override
  public Space stateSpace() {
    return space;
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    for (int i = 0; i < n; i++) {
      next[i] = state[i] + dt * (0.5 * Math.sin(state[(i + 1) % n]) - state[i]);
    }
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    for (int i = 0; i < n; i++) {
      int j = (i + 1) % n;
      jacobian[i * n + i] += 1 - dt;
      jacobian[i * n + j] += 0.5 * dt * Math.cos(state[j]);
    }
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    for (int i = 0; i < n; i++) {
      covariance[i * (n + 1)] = 0.001 * dt;
    }
  }
}

package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableMotion;

/**
 * A linear motion that is the same on each of a number of axes, with noise of its own on each. State: the first
 * quantity on all axes, then its rate on all axes, and so on. The matrix of an axis is upper triangular.
 */
abstract class AxisMotion implements TwiceDifferentiableMotion {
  private final int axes;
  private final double[] densities;
  private final int quantities;
  private final FlatSpace space;
  private final Structure structure;

  /** Spectral densities of the noise, one for each axis; kept. */
  AxisMotion(double[] densities, int quantities) {
    this.axes = densities.length;
    this.densities = densities;
    this.quantities = quantities;
    this.space = Space.reals(axes * quantities);
    int[] all = Structure.UNKNOWN.activeInputs(space.dimension());
    this.structure = Structure.UNKNOWN.withLinearInputs(all);
  }

  /** Entry of the transition matrix of an axis, column at or right of row. */
  abstract double transition(int row, int column, double dt);

  /** Entry of the process noise for a density of 1, column at or right of row. */
  abstract double noise(int row, int column, double dt);

  @Override
  public final FlatSpace stateSpace() {
    return space;
  }

  /** {@return a structure that says: linear in all} */
  @Override
  public final Structure structure() {
    return structure;
  }

  @Override
  public final void move(double[] state, double[] control, double time, double dt, double[] next) {
    for (int row = 0; row < quantities; row++) {
      double own = transition(row, row, dt);
      for (int i = row * axes; i < (row + 1) * axes; i++) {
        next[i] = own * state[i];
      }
      for (int column = row + 1; column < quantities; column++) {
        add(transition(row, column, dt), state, column * axes, next, row * axes);
      }
    }
  }

  private void add(double factor, double[] state, int from, double[] next, int to) {
    for (int axis = 0; axis < axes; axis++) {
      next[to + axis] += factor * state[from + axis];
    }
  }

  @Override
  public final void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    int n = space.dimension();
    for (int row = 0; row < quantities; row++) {
      for (int column = row; column < quantities; column++) {
        double entry = transition(row, column, dt);
        for (int axis = 0; axis < axes; axis++) {
          jacobian[(row * axes + axis) * n + column * axes + axis] = entry;
        }
      }
    }
  }

  /** Leaves the zeros that are there. */
  @Override
  public final void moveHessian(
      double[] state, double[] control, double time, double dt, double[] hessians) {}

  @Override
  public final void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    int n = space.dimension();
    for (int row = 0; row < quantities; row++) {
      for (int column = row; column < quantities; column++) {
        double unit = noise(row, column, dt);
        for (int axis = 0; axis < axes; axis++) {
          double entry = densities[axis] * unit;
          covariance[(row * axes + axis) * n + column * axes + axis] = entry;
          covariance[(column * axes + axis) * n + row * axes + axis] = entry;
        }
      }
    }
  }
}

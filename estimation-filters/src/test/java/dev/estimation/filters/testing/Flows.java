package dev.estimation.filters.testing;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.motion.ContinuousMotion;
import dev.estimation.filters.motion.DifferentiableContinuousMotion;

/** Motions in continuous time. */
public final class Flows {
  private Flows() {}

  /** x'' = w on a line. */
  public record Straight(double density) implements DifferentiableContinuousMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(2);
    }

    @Override
    public void drift(double[] state, double[] control, double time, double[] rate) {
      rate[0] = state[1];
      rate[1] = 0;
    }

    @Override
    public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
      jacobian[1] = 1;
    }

    @Override
    public void noiseDensity(double[] state, double[] control, double time, double[] density) {
      density[3] = this.density;
    }
  }

  /** x''' = -x'' / tau + w on a line. */
  public record Fading(double timeConstant, double density)
      implements DifferentiableContinuousMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(3);
    }

    @Override
    public void drift(double[] state, double[] control, double time, double[] rate) {
      rate[0] = state[1];
      rate[1] = state[2];
      rate[2] = -state[2] / timeConstant;
    }

    @Override
    public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
      jacobian[1] = 1;
      jacobian[5] = 1;
      jacobian[8] = -1 / timeConstant;
    }

    @Override
    public void noiseDensity(double[] state, double[] control, double time, double[] density) {
      density[8] = this.density;
    }
  }

  /** Place, speed, heading and turn rate; noise on acceleration along the course and on the turn rate. */
  public record Polar(double acceleration, double turn) implements DifferentiableContinuousMotion {
    private static final FlatSpace SPACE = Space.reals(3).and(Space.angles(1)).and(Space.reals(1));

    @Override
    public Space stateSpace() {
      return SPACE;
    }

    @Override
    public void drift(double[] state, double[] control, double time, double[] rate) {
      rate[0] = state[2] * Math.cos(state[3]);
      rate[1] = state[2] * Math.sin(state[3]);
      rate[2] = 0;
      rate[3] = state[4];
      rate[4] = 0;
    }

    @Override
    public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
      jacobian[2] = Math.cos(state[3]);
      jacobian[3] = -state[2] * Math.sin(state[3]);
      jacobian[7] = Math.sin(state[3]);
      jacobian[8] = state[2] * Math.cos(state[3]);
      jacobian[19] = 1;
    }

    @Override
    public void noiseDensity(double[] state, double[] control, double time, double[] density) {
      density[12] = acceleration;
      density[24] = turn;
    }
  }

  /** x' = control x + time, without a Jacobian: x(t) has a closed form. Noise of a density that grows with time. */
  public record Forced() implements ContinuousMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(1);
    }

    @Override
    public int controlDimension() {
      return 1;
    }

    @Override
    public void drift(double[] state, double[] control, double time, double[] rate) {
      rate[0] = control[0] * state[0] + time;
    }

    @Override
    public void noiseDensity(double[] state, double[] control, double time, double[] density) {
      density[0] = time;
    }
  }

  /** x' = x^2 + 0 sqrt(limit - x): leaves in a finite time, and has no number above a limit. */
  public record Explosive(double limit) implements DifferentiableContinuousMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(1);
    }

    @Override
    public void drift(double[] state, double[] control, double time, double[] rate) {
      rate[0] = state[0] * state[0] + 0 * Math.sqrt(limit - state[0]);
    }

    @Override
    public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
      jacobian[0] = 2 * state[0];
    }

    @Override
    public void noiseDensity(double[] state, double[] control, double time, double[] density) {
      density[0] = 0.01;
    }
  }

  /** x' = -rate x: stiff over times far longer than 1 / rate. */
  public record Stiff(double decay) implements DifferentiableContinuousMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(1);
    }

    @Override
    public void drift(double[] state, double[] control, double time, double[] rate) {
      rate[0] = -decay * state[0];
    }

    @Override
    public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
      jacobian[0] = -decay;
    }

    @Override
    public void noiseDensity(double[] state, double[] control, double time, double[] density) {
      density[0] = 1;
    }
  }
}

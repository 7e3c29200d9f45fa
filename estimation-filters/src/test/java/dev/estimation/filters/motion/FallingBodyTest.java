package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import org.junit.jupiter.api.Test;

/** Integrated to 1e-11, in the feet of the published problem: no formula knows the unit. */
class FallingBodyTest extends MotionContract {
  private static final double DECAY = 5e-5;
  private static final double[] ENTRY = {3e5, 2e4, 1e-3};
  private static final double[] NONE = {};

  private final DifferentiableMotion free = integrated(new FallingBody(DECAY, 0, 0, 0));

  private static DifferentiableMotion integrated(FallingBody body) {
    return IntegratedMotion.of(body, 1e-11, 1e-6, 1e-8, 1e-14);
  }

  @Override
  DifferentiableMotion model() {
    return integrated(new FallingBody(DECAY, 32.2, 0.5, 1e-12));
  }

  /** High and fast, in thick air, rising, without drag. */
  @Override
  double[][] states() {
    return new double[][] {
      ENTRY.clone(), {6e4, 6e3, 1e-3}, {3e4, -800, 5e-4}, {1e5, 2e3, 0}, {1e4, 300, -2e-5}
    };
  }

  @Override
  double[] scales() {
    return new double[] {2e4, 1e3, 1e-3};
  }

  @Override
  double[] durations() {
    return new double[] {1e-6, 0.05, 1, 5};
  }

  /**
   * v exp((b / c) exp(-c h)) stays what it is (Allen and Eggers 1958, NACA report 1381), over 60 s with the constants of
   * Athans, Wishner and Bertolini 1968. Tolerance: 60 steps of 1e-11 in the logarithm of v; what an error of h by 1e-11 of
   * itself does is less.
   */
  @Test
  void keepsTheInvariantOfAllenAndEggers() {
    double[] state = ENTRY.clone();
    double kept = invariant(state);
    for (int second = 0; second < 60; second++) {
      state = MotionFunctions.moved(free, state, NONE, 1);
      assertEquals(kept, invariant(state), 1e-9);
    }
    assertEquals(1e-3, state[2], 0);
  }

  /** The logarithm, so that differences are relative. */
  private static double invariant(double[] state) {
    return Math.log(state[1]) + state[2] / DECAY * Math.exp(-DECAY * state[0]);
  }

  /**
   * Without gravity, time, speed and altitude can each be scaled or shifted, and so the flow from (h, v, b) to (H, V)
   * has dH/dv = -dt V / v, dH/dh = V / v (1 + D dt), dV/dv = V / v - dt E / v, dH/db = (1 - dH/dh) / (c b), with D = b exp(-c h) v
   * and E = b exp(-c H) V^2 the deceleration at the end; derived here.
   */
  @Test
  void jacobianHasTheSymmetriesOfTheFlow() {
    for (double[] start : new double[][] {ENTRY, {8e4, 1.5e4, 1e-3}, {2e4, 900, 3e-3}}) {
      for (double dt : new double[] {0.1, 2, 8}) {
        double[] end = MotionFunctions.moved(free, start, NONE, dt);
        double[] jacobian = MotionFunctions.jacobian(free, start, NONE, dt);
        double ratio = end[1] / start[1];
        double drag = start[2] * Math.exp(-DECAY * start[0]) * start[1];
        double braking = end[2] * Math.exp(-DECAY * end[0]) * end[1] * end[1];
        double byHeight = ratio * (1 + drag * dt);
        double byBallistic = (1 - byHeight) / (DECAY * start[2]);
        assertEquals(byHeight, jacobian[0], 1e-9);
        assertEquals(-dt * ratio, jacobian[1], 1e-9 * dt);
        // A difference of numbers near 1 over 5e-8: 1e-11 becomes 1e-3, of values up to 1e7.
        assertEquals(byBallistic, jacobian[2], 1e-2 + 1e-9 * Math.abs(byBallistic));
        assertEquals(ratio - dt * braking / start[1], jacobian[4], 1e-9);
      }
    }
  }

  /**
   * Along the path of the mean noise composes though the motion is not linear: two steps of h from where each begins, and one of
   * 2 h. To 1e-6 of the deviations: each of three integrations is right to 1e-9 of its entries, and large ones cancel.
   */
  @Test
  void noiseComposesAlongThePath() {
    for (double[] state : states()) {
      double[] half = MotionFunctions.moved(model(), state, NONE, 1.5);
      double[] f = MotionFunctions.jacobian(model(), half, NONE, 1.5);
      double[] first = MotionFunctions.noise(model(), state, NONE, 1.5);
      double[] second = MotionFunctions.noise(model(), half, NONE, 1.5);
      checkComposes(f, first, second, MotionFunctions.noise(model(), state, NONE, 3), 3, 1e-6);
    }
  }

  /** Without drag: a stone. */
  @Test
  void fallsFreelyWithoutDrag() {
    DifferentiableMotion stone = integrated(new FallingBody(1 / 7000.0, 9.81, 0, 0));
    double[] next = MotionFunctions.moved(stone, new double[] {5000, 20, 0}, NONE, 10);
    assertArrayEquals(new double[] {5000 - 200 - 490.5, 118.1, 0}, next, 1e-9); // roundings of 5000
  }

  /** With a decay of 0 the air is everywhere as thick: v = v0 / (1 + b v0 t). */
  @Test
  void brakesInAirOfOneDensity() {
    DifferentiableMotion body = integrated(new FallingBody(0, 0, 0, 0));
    double[] next = MotionFunctions.moved(body, new double[] {1e4, 500, 1e-3}, NONE, 6);
    double fallen = Math.log(1 + 1e-3 * 500 * 6) / 1e-3;
    assertArrayEquals(new double[] {1e4 - fallen, 500 / 4.0, 1e-3}, next, 1e-6);
  }
}

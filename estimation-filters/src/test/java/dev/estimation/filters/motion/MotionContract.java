package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import java.util.Arrays;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;

/** What every ready model with added noise keeps. */
abstract class MotionContract {
  /** From a step that is next to nothing to one over which a vessel crosses an ocean. */
  private static final double[] ALL_DURATIONS = {1e-9, 1e-3, 0.3, 7, 1e3, 1e9};

  /** The model, with noise on everything it can have it on. */
  abstract DifferentiableMotion model();

  /** Points to look at. */
  abstract double[][] states();

  /** Lengths over which the model bends, one for each dimension. */
  abstract double[] scales();

  double[] control() {
    return new double[0];
  }

  /** Durations over which the motion is asked for at these states. */
  double[] durations() {
    return new double[] {1e-6, 0.05, 1, 40};
  }

  @Test
  @DisplayName("Jacobian, Hessian and active inputs are those of the move")
  void derivativesAreThoseOfTheMove() {
    for (double[] state : states()) {
      for (double dt : durations()) {
        MotionFunctions.checkDerivatives(model(), state, control(), dt, scales());
      }
    }
  }

  /** f(x + u) - f(x) = J(x) u however far u goes along linear inputs; to rounding of the sums. */
  @Test
  @DisplayName("linear inputs are linear")
  void linearInputsAreLinear() {
    Random random = new Random(1);
    for (double[] state : states()) {
      for (double dt : durations()) {
        for (int draw = 0; draw < 5; draw++) {
          double[] u = new double[scales().length];
          for (int index : model().structure().linearInputs()) {
            u[index] = 100 * scales()[index] * random.nextGaussian();
          }
          checkLinear(state, u, dt);
        }
      }
    }
  }

  private void checkLinear(double[] state, double[] u, double dt) {
    Space space = model().stateSpace();
    double[] far = new double[space.storage()];
    space.displace(state, u, far);
    double[] here = MotionFunctions.moved(model(), state, control(), dt);
    double[] there = MotionFunctions.moved(model(), far, control(), dt);
    double[] change = new double[u.length];
    space.difference(there, here, change);
    double[] jacobian = MotionFunctions.jacobian(model(), state, control(), dt);
    for (int i = 0; i < u.length; i++) {
      double wanted = 0;
      double size = Math.abs(here[Math.min(i, here.length - 1)]);
      for (int j = 0; j < u.length; j++) {
        wanted += jacobian[i * u.length + j] * u[j];
        size += Math.abs(jacobian[i * u.length + j]) * (Math.abs(u[j]) + Math.abs(state[j]));
      }
      assertEquals(wanted, change[i], 1e-14 * size);
    }
  }

  @Test
  @DisplayName("process noise is symmetric and positive semi-definite")
  void noiseIsACovariance() {
    int n = scales().length;
    Covariance covariance = new Covariance(n);
    for (double[] state : states()) {
      for (double dt : isLinear() ? ALL_DURATIONS : durations()) {
        double[] noise = MotionFunctions.noise(model(), state, control(), dt);
        for (int i = 0; i < n; i++) {
          for (int j = 0; j < i; j++) {
            assertEquals(noise[j * n + i], noise[i * n + j], 0);
          }
        }
        System.arraycopy(noise, 0, covariance.changeMatrix().data, 0, n * n);
        assertTrue(covariance.factor(), () -> "dt " + dt + ": " + covariance.failure());
      }
    }
  }

  private boolean isLinear() {
    return model().structure().linearInputs().length == scales().length;
  }

  @Test
  @DisplayName("the same question has the same answer, bit for bit, and arguments are only read")
  void deterministic() {
    for (double[] state : states()) {
      double[] copy = state.clone();
      double[] control = control();
      double[] first = all(state, control);
      assertArrayEquals(first, all(state, control), 0);
      assertArrayEquals(copy, state, 0);
      assertArrayEquals(control(), control, 0);
    }
  }

  private double[] all(double[] state, double[] control) {
    double[] next = MotionFunctions.moved(model(), state, control, 0.7);
    double[] jacobian = MotionFunctions.jacobian(model(), state, control, 0.7);
    double[] noise = MotionFunctions.noise(model(), state, control, 0.7);
    return Stream.of(next, jacobian, noise).flatMapToDouble(Arrays::stream).toArray();
  }

  /**
   * F(h) F(h) = F(2 h) and F(h) Q(h) F(h)' + Q(h) = Q(2 h): entries of F to 1e-13 of themselves, of Q to 1e-13 of the
   * deviations of both components. All sums are of positive numbers, so a few roundings of 1e-16 are expected, and
   * of the exponent of a fading acceleration a few hundred.
   */
  @Test
  @DisplayName("a linear motion composes over time")
  void composesOverTime() {
    int n = scales().length;
    if (!isLinear()) {
      return;
    }
    for (double[] state : states()) {
      for (double h : ALL_DURATIONS) {
        double[] f = MotionFunctions.jacobian(model(), state, control(), h);
        double[] q = MotionFunctions.noise(model(), state, control(), h);
        double[] twice = MotionFunctions.jacobian(model(), state, control(), 2 * h);
        double[] both = MotionFunctions.noise(model(), state, control(), 2 * h);
        for (int i = 0; i < n; i++) {
          for (int j = 0; j < n; j++) {
            double transition = twice[i * n + j];
            assertEquals(transition, product(f, f, i, j, n), 1e-13 * Math.abs(transition));
          }
        }
        checkComposes(f, q, q, both, n, 1e-13);
      }
    }
  }

  /** F Q1 F' + Q2 is that over both steps, relative to the deviations of both components. */
  static void checkComposes(
      double[] f, double[] q1, double[] q2, double[] both, int n, double relative) {
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double carried = q2[i * n + j];
        for (int k = 0; k < n; k++) {
          carried += product(f, q1, i, k, n) * f[j * n + k];
        }
        double limit = relative * Math.sqrt(both[i * n + i] * both[j * n + j]);
        assertEquals(both[i * n + j], carried, limit, "Q[" + i + "][" + j + "]");
      }
    }
  }

  private static double product(double[] a, double[] b, int row, int column, int n) {
    double sum = 0;
    for (int k = 0; k < n; k++) {
      sum += a[row * n + k] * b[k * n + column];
    }
    return sum;
  }
}

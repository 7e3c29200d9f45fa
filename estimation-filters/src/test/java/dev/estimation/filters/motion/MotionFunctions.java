package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.JacobianCheck;
import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import java.util.Arrays;

/** What models give at a time, in fresh arrays, and their derivatives held against differences. */
final class MotionFunctions {
  private MotionFunctions() {}

  static double[] moved(MotionModel model, double[] state, double[] control, double dt) {
    double[] next = new double[model.stateSpace().storage()];
    Arrays.fill(next, Double.NaN);
    model.move(state, control, 0, dt, next);
    return next;
  }

  static double[] jacobian(
      DifferentiableMotion model, double[] state, double[] control, double dt) {
    double[] jacobian = square(model.stateSpace().dimension());
    model.moveJacobian(state, control, 0, dt, jacobian);
    return jacobian;
  }

  static double[] noise(MotionModel model, double[] state, double[] control, double dt) {
    double[] covariance = square(model.stateSpace().dimension());
    model.processNoise(state, control, 0, dt, covariance);
    return covariance;
  }

  static double[] square(int n) {
    return new double[n * n];
  }

  /** Jacobian, Hessian if there is one, and active inputs. */
  static void checkDerivatives(
      DifferentiableMotion model, double[] state, double[] control, double dt, double[] scales) {
    Structure structure = model
        .structure()
        .withJacobian((input, given, filled) -> model.moveJacobian(input, given, 0, dt, filled));
    if (model instanceof TwiceDifferentiableMotion twice) {
      structure = structure.withHessian(
          (input, given, filled) -> twice.moveHessian(input, given, 0, dt, filled));
    }
    VectorFunction move = (input, given, output) -> model.move(input, given, 0, dt, output);
    Space space = model.stateSpace();
    check(space, space, new Known(move, structure), scales, control, state);
  }

  /** Both Jacobians of a noise-driven motion of reals and angles; scales of state, then of noise. */
  static void checkDerivatives(
      DifferentiableNoiseDrivenMotion model,
      double[] state,
      double[] noise,
      double[] control,
      double dt,
      double... scales) {
    int d = state.length;
    int q = noise.length;
    VectorFunction move =
        (input, given, output) -> model.move(head(input, d), tail(input, d), given, 0, dt, output);
    Structure structure = model.structure().withJacobian((input, given, filled) -> {
      double[] byState = new double[d * d];
      double[] byNoise = new double[d * q];
      model.moveJacobians(head(input, d), tail(input, d), given, 0, dt, byState, byNoise);
      for (int r = 0; r < d; r++) {
        System.arraycopy(byState, r * d, filled, r * (d + q), d);
        System.arraycopy(byNoise, r * q, filled, r * (d + q) + d, q);
      }
    });
    double[] joint = Arrays.copyOf(state, d + q);
    System.arraycopy(noise, 0, joint, d, q);
    Space space = model.stateSpace();
    check(space.and(Space.reals(q)), space, new Known(move, structure), scales, control, joint);
  }

  private static double[] head(double[] joint, int length) {
    return Arrays.copyOf(joint, length);
  }

  private static double[] tail(double[] joint, int from) {
    return Arrays.copyOfRange(joint, from, joint.length);
  }

  private static void check(
      Space input, Space output, Known function, double[] scales, double[] given, double[] point) {
    JacobianCheck check = JacobianCheck.of(input, output, function, scales, given, point);
    assertTrue(check.passed(), check::toString);
  }

  private record Known(VectorFunction values, Structure structure) implements VectorFunction {
    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      values.evaluate(input, given, output);
    }
  }
}

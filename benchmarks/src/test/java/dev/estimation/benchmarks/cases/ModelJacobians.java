package dev.estimation.benchmarks.cases;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.JacobianCheck;
import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import java.util.Arrays;

/** Holds the Jacobians and active inputs of models against differences. */
public final class ModelJacobians {
  private static final double[] NONE = {};

  private ModelJacobians() {}

  /** At a state; scales are lengths over which the model bends. */
  public static void motion(
      DifferentiableMotion model, double[] state, double dt, double[] scales) {
    VectorFunction move = (input, given, output) -> model.move(input, given, 0, dt, output);
    Jacobian jacobian = (input, given, filled) -> model.moveJacobian(input, given, 0, dt, filled);
    Space space = model.stateSpace();
    check(
        space,
        space,
        new Model(move, model.structure().withJacobian(jacobian)),
        state,
        NONE,
        scales);
  }

  /** Both Jacobians of a noise-driven motion, over state and noise; scales of both, one after the other. */
  public static void noiseDriven(
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
    Jacobian jacobian = (input, given, filled) -> {
      double[] byState = new double[d * d];
      double[] byNoise = new double[d * q];
      model.moveJacobians(head(input, d), tail(input, d), given, 0, dt, byState, byNoise);
      for (int r = 0; r < d; r++) {
        System.arraycopy(byState, r * d, filled, r * (d + q), d);
        System.arraycopy(byNoise, r * q, filled, r * (d + q) + d, q);
      }
    };
    double[] joint = Arrays.copyOf(state, d + q);
    System.arraycopy(noise, 0, joint, d, q);
    Space space = model.stateSpace();
    Model function = new Model(move, model.structure().withJacobian(jacobian));
    check(space.and(Space.reals(q)), space, function, joint, control, scales);
  }

  private static double[] head(double[] joint, int length) {
    return Arrays.copyOf(joint, length);
  }

  private static double[] tail(double[] joint, int from) {
    return Arrays.copyOfRange(joint, from, joint.length);
  }

  /** At a state. */
  public static void sensor(
      DifferentiableSensor model,
      Space stateSpace,
      double[] state,
      double[] given,
      double[] scales) {
    Structure structure = model.structure().withJacobian(model::measureJacobian);
    Model function = new Model(model::measure, structure);
    check(stateSpace, model.measurementSpace(), function, state, given, scales);
  }

  private static void check(
      Space input, Space output, Model model, double[] point, double[] given, double[] scales) {
    JacobianCheck check = JacobianCheck.of(input, output, model, scales, given, point);
    assertTrue(check.passed(), check::toString);
  }

  private record Model(VectorFunction values, Structure structure) implements VectorFunction {
    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      values.evaluate(input, given, output);
    }
  }
}

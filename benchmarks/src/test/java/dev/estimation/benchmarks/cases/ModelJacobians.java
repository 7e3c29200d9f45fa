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

  /** Both Jacobians of a noise-driven motion at noise 0. */
  public static void noiseDriven(
      DifferentiableNoiseDrivenMotion model,
      double[] state,
      double[] control,
      double dt,
      double[] scales,
      double[] noiseScales) {
    int d = state.length;
    int q = noiseScales.length;
    double[] noNoise = new double[q];
    Space space = model.stateSpace();
    VectorFunction byState =
        (input, given, output) -> model.move(input, noNoise, given, 0, dt, output);
    Jacobian stateJacobian = (input, given, filled) ->
        model.moveJacobians(input, given, 0, dt, filled, new double[d * q]);
    check(space, space, new Model(byState, stateJacobian), state, control, scales);
    VectorFunction byNoise =
        (input, given, output) -> model.move(state, input, given, 0, dt, output);
    Jacobian noiseJacobian = (input, given, filled) ->
        model.moveJacobians(state, given, 0, dt, new double[d * d], filled);
    check(Space.reals(q), space, new Model(byNoise, noiseJacobian), noNoise, control, noiseScales);
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
    Model(VectorFunction values, Jacobian jacobian) {
      this(values, Structure.UNKNOWN.withJacobian(jacobian));
    }

    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      values.evaluate(input, given, output);
    }
  }
}

package dev.estimation.benchmarks.cases;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.JacobianCheck;
import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/** Holds the Jacobians and active inputs of sensors against differences. */
public final class ModelJacobians {
  private ModelJacobians() {}

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

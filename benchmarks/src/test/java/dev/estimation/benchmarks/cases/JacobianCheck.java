package dev.estimation.benchmarks.cases;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.CentralDifferences;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;

/** Holds analytic Jacobians against central differences. */
public final class JacobianCheck {
  private JacobianCheck() {}

  /**
   * Compares at a state.
   *
   * @param scales of the state, lengths over which the model bends
   * @param tolerance relative to the largest entry of each row times the scale of each column
   */
  public static void motion(
      DifferentiableMotion model, double[] state, double dt, double[] scales, double tolerance) {
    double[] none = new double[0];
    int n = state.length;
    double[] analytic = new double[n * n];
    model.moveJacobian(state, none, 0, dt, analytic);
    VectorFunction move = (input, given, output) -> model.move(input, none, 0, dt, output);
    compare(model.stateSpace(), model.stateSpace(), move, state, none, scales, analytic, tolerance);
  }

  /** Compares both Jacobians of a noise-driven motion at noise 0, as {@link #motion}. */
  public static void noiseDriven(
      DifferentiableNoiseDrivenMotion model,
      double[] state,
      double[] control,
      double dt,
      double[] scales,
      double[] noiseScales,
      double tolerance) {
    double[] noNoise = new double[noiseScales.length];
    double[] byState = new double[state.length * state.length];
    double[] byNoise = new double[state.length * noiseScales.length];
    model.moveJacobians(state, control, 0, dt, byState, byNoise);
    VectorFunction ofState =
        (input, given, output) -> model.move(input, noNoise, control, 0, dt, output);
    VectorFunction ofNoise =
        (input, given, output) -> model.move(state, input, control, 0, dt, output);
    Space space = model.stateSpace();
    Space noise = Space.reals(noiseScales.length);
    double[] none = new double[0];
    compare(space, space, ofState, state, none, scales, byState, tolerance);
    compare(noise, space, ofNoise, noNoise, none, noiseScales, byNoise, tolerance);
  }

  /** Compares at a state, as {@link #motion}. */
  public static void sensor(
      DifferentiableSensor model,
      Space stateSpace,
      double[] state,
      double[] given,
      double[] scales,
      double tolerance) {
    double[] analytic = new double[model.measurementSpace().dimension() * state.length];
    model.measureJacobian(state, given, analytic);
    compare(
        stateSpace,
        model.measurementSpace(),
        model::measure,
        state,
        given,
        scales,
        analytic,
        tolerance);
  }

  private static void compare(
      Space input,
      Space output,
      VectorFunction function,
      double[] point,
      double[] given,
      double[] scales,
      double[] analytic,
      double tolerance) {
    double[] numerical = new double[analytic.length];
    new CentralDifferences(input, output, function, scales).evaluate(point, given, numerical);
    int n = scales.length;
    for (int row = 0; row < output.dimension(); row++) {
      double largest = 0;
      for (int column = 0; column < n; column++) {
        largest = Math.max(largest, Math.abs(analytic[row * n + column]) * scales[column]);
      }
      for (int column = 0; column < n; column++) {
        int entry = row * n + column;
        assertEquals(
            numerical[entry],
            analytic[entry],
            tolerance * largest / scales[column],
            "entry [" + row + "][" + column + "]");
      }
    }
  }
}

package dev.estimation.benchmarks.jmh;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/** Range and bearing from the origin, written as plainly as in a textbook. */
final class Sight implements DifferentiableSensor {
  private final Space space = Space.reals(1).and(Space.angles(1));
  private final Structure structure = Structure.UNKNOWN.withActiveInputs(0, 1);

  @Override
  public Space measurementSpace() {
    return space;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = Math.sqrt(state[0] * state[0] + state[1] * state[1]);
    measurement[1] = Math.atan2(state[1], state[0]);
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    double square = state[0] * state[0] + state[1] * state[1];
    double range = Math.sqrt(square);
    jacobian[0] = state[0] / range;
    jacobian[1] = state[1] / range;
    jacobian[5] = -state[1] / square;
    jacobian[6] = state[0] / square;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    covariance[0] = TurnProblem.RANGE_VARIANCE;
    covariance[3] = TurnProblem.BEARING_VARIANCE;
  }

  @Override
  public Structure structure() {
    return structure;
  }
}

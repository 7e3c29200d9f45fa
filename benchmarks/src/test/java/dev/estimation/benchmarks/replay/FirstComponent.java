package dev.estimation.benchmarks.replay;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import java.util.Arrays;
import java.util.List;

/** The first component of the state with a variance of 1, as it is. */
final class FirstComponent implements DifferentiableSensor {
  @Override
  public Space measurementSpace() {
    return Space.reals(1);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    measurement[0] = state[0];
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    jacobian[0] = 1;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    covariance[0] = 1;
  }

  /** {@return one measurement for each value, in that order} */
  List<Measurement> measurements(double... values) {
    return Arrays.stream(values)
        .mapToObj(value -> new Measurement(this, new double[] {value}))
        .toList();
  }
}

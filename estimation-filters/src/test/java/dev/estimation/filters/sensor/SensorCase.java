package dev.estimation.filters.sensor;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.TwiceDifferentiableSensor;
import java.util.Arrays;

/**
 * A sensor in a state, with what is given and places to look at.
 *
 * @param name of the layout
 * @param sensor the sensor
 * @param space of the state
 * @param scale a length over which the sensor bends noticeably, for every column
 * @param given with each measurement
 * @param points states
 */
record SensorCase(
    String name,
    DifferentiableSensor sensor,
    Space space,
    double scale,
    double[] given,
    double[]... points) {

  double[] scales() {
    double[] scales = new double[space.dimension()];
    Arrays.fill(scales, scale);
    return scales;
  }

  int size() {
    return sensor.measurementSpace().dimension();
  }

  /** What is measured, with NaN where the sensor left something out. */
  double[] measured(double[] state) {
    double[] measurement = new double[sensor.measurementSpace().storage()];
    Arrays.fill(measurement, Double.NaN);
    sensor.measure(state, given, measurement);
    return measurement;
  }

  double[] jacobian(double[] state) {
    double[] jacobian = new double[size() * space.dimension()];
    sensor.measureJacobian(state, given, jacobian);
    return jacobian;
  }

  double[] hessian(double[] state) {
    double[] hessians = new double[size() * space.dimension() * space.dimension()];
    if (sensor instanceof TwiceDifferentiableSensor twice) {
      twice.measureHessian(state, given, hessians);
    }
    return hessians;
  }

  double[] noise(double[] state) {
    double[] covariance = new double[size() * size()];
    sensor.measurementNoise(state, given, covariance);
    return covariance;
  }

  /** The measurement at a displaced state. */
  double[] measured(double[] state, double[] tangent) {
    double[] displaced = new double[state.length];
    space.displace(state, tangent, displaced);
    return measured(displaced);
  }

  /** The sensor as a function with all that it knows. */
  VectorFunction function() {
    Structure once = sensor.structure().withJacobian(sensor::measureJacobian);
    Structure structure = sensor instanceof TwiceDifferentiableSensor twice
        ? once.withHessian(twice::measureHessian)
        : once;
    return new VectorFunction() {
      @Override
      public void evaluate(double[] input, double[] known, double[] output) {
        sensor.measure(input, known, output);
      }

      @Override
      public Structure structure() {
        return structure;
      }
    };
  }

  @Override
  public String toString() {
    return name;
  }
}

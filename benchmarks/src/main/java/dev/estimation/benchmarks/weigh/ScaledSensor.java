package dev.estimation.benchmarks.weigh;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/** A sensor whose noise has other standard deviations, all by one factor; otherwise the same. <i>Immutable.</i> */
class ScaledSensor implements SensorModel {
  private final SensorModel original;
  private final double factor;

  private ScaledSensor(SensorModel original, double factor) {
    this.original = original;
    this.factor = factor;
  }

  /** {@return the scaled sensor, with the derivatives that the original has} */
  static ScaledSensor of(SensorModel original, double factor) {
    if (original instanceof TwiceDifferentiableSensor twice) {
      return new Twice(twice, factor);
    }
    return original instanceof DifferentiableSensor once
        ? new Once(once, factor)
        : new ScaledSensor(original, factor);
  }

  SensorModel original() {
    return original;
  }

  @Override
  public Space measurementSpace() {
    return original.measurementSpace();
  }

  @Override
  public int givenDimension() {
    return original.givenDimension();
  }

  @Override
  public Structure structure() {
    return original.structure();
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    original.measure(state, given, measurement);
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    original.measurementNoise(state, given, covariance);
    for (int i = 0; i < covariance.length; i++) {
      covariance[i] *= factor * factor;
    }
  }

  private static class Once extends ScaledSensor implements DifferentiableSensor {
    private final DifferentiableSensor derivatives;

    Once(DifferentiableSensor original, double factor) {
      super(original, factor);
      this.derivatives = original;
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      derivatives.measureJacobian(state, given, jacobian);
    }
  }

  private static final class Twice extends Once implements TwiceDifferentiableSensor {
    private final TwiceDifferentiableSensor second;

    Twice(TwiceDifferentiableSensor original, double factor) {
      super(original, factor);
      this.second = original;
    }

    @Override
    public void measureHessian(double[] state, double[] given, double[] hessians) {
      second.measureHessian(state, given, hessians);
    }
  }
}

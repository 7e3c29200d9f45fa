package dev.estimation.benchmarks.cases.uwb;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * The distance (m) of a tag of known height to an anchor, plus a constant bias. Given: the anchor's
 * x, y, z (m). The state begins with x and y. <i>Immutable.</i>
 */
final class AnchorRange implements DifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1);
  private static final Structure POSITION_ONLY = Structure.UNKNOWN.withActiveInputs(0, 1);

  private final double height;
  private final double bias;
  private final double deviation;

  /**
   * The sensor.
   *
   * @param height of the tag (m)
   * @param bias m
   * @param deviation of the noise (m)
   */
  AnchorRange(double height, double bias, double deviation) {
    this.height = height;
    this.bias = bias;
    this.deviation = deviation;
  }

  @Override
  public FlatSpace measurementSpace() {
    return SPACE;
  }

  @Override
  public int givenDimension() {
    return 3;
  }

  @Override
  public void measure(double[] state, double[] anchor, double[] measurement) {
    measurement[0] = distance(state, anchor) + bias;
  }

  private double distance(double[] state, double[] anchor) {
    double x = state[0] - anchor[0];
    double y = state[1] - anchor[1];
    double z = height - anchor[2];
    return Math.sqrt(x * x + y * y + z * z);
  }

  @Override
  public void measureJacobian(double[] state, double[] anchor, double[] jacobian) {
    double distance = distance(state, anchor);
    jacobian[0] = (state[0] - anchor[0]) / distance;
    jacobian[1] = (state[1] - anchor[1]) / distance;
  }

  @Override
  public void measurementNoise(double[] state, double[] anchor, double[] covariance) {
    covariance[0] = deviation * deviation;
  }

  @Override
  public Structure structure() {
    return POSITION_ONLY;
  }
}

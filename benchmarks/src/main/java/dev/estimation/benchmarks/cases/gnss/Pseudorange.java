package dev.estimation.benchmarks.cases.gnss;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;

/**
 * The distance (m) of a receiver to a satellite plus the receiver's clock. Given: the satellite's
 * x, y, z (m) and its elevation (rad), since low satellites are heard with more noise. The state
 * begins with x, y, z and clock (m). <i>Immutable.</i>
 */
final class Pseudorange implements DifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1);

  /** Linear in the clock. */
  private static final Structure PLACE_AND_CLOCK =
      Structure.UNKNOWN.withActiveInputs(0, 1, 2, 3).withLinearInputs(3);

  private final double deviation;
  private final double lowDeviation;

  /**
   * The sensor, whose variance is that of two independent errors.
   *
   * @param deviation of the error that is the same at every elevation (m)
   * @param lowDeviation of the error that goes with 1 / sin(elevation) (m)
   */
  Pseudorange(double deviation, double lowDeviation) {
    this.deviation = deviation;
    this.lowDeviation = lowDeviation;
  }

  @Override
  public FlatSpace measurementSpace() {
    return SPACE;
  }

  @Override
  public int givenDimension() {
    return 4;
  }

  @Override
  public void measure(double[] state, double[] satellite, double[] measurement) {
    measurement[0] = distance(state, satellite) + state[3];
  }

  private static double distance(double[] state, double[] satellite) {
    double x = satellite[0] - state[0];
    double y = satellite[1] - state[1];
    double z = satellite[2] - state[2];
    return Math.sqrt(x * x + y * y + z * z);
  }

  @Override
  public void measureJacobian(double[] state, double[] satellite, double[] jacobian) {
    double distance = distance(state, satellite);
    for (int i = 0; i < 3; i++) {
      jacobian[i] = (state[i] - satellite[i]) / distance;
    }
    jacobian[3] = 1;
  }

  @Override
  public void measurementNoise(double[] state, double[] satellite, double[] covariance) {
    double sin = Math.sin(satellite[3]);
    covariance[0] = deviation * deviation + lowDeviation * lowDeviation / (sin * sin);
  }

  @Override
  public Structure structure() {
    return PLACE_AND_CLOCK;
  }
}

package dev.estimation.filters.sensor;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/**
 * A distance plus the receiver's clock (m): |d| + c, c the time by which the clock is ahead, times the speed of light. Also
 * any range with a bias that is estimated.
 *
 * <p>Given: the place of the satellite (m), 3 numbers in space, and the standard deviation (m) where it is said to be given. The
 * place is that at the time of sending, in the axes that an Earth-fixed frame has at the time of reception; the satellite's
 * clock and the delays of the atmosphere are taken off the measurement before.
 *
 * <p>Declared linear in the clock, so that points are drawn over the position alone. With few points and a spread over which
 * ranges bend by many times the noise that may cost honesty, since points lie nearer to the mean (see {@link Structure}); a
 * matching over the whole input makes no use of it. At distance 0 derivatives are NaN. <i>Immutable.</i>
 */
public final class Pseudorange extends ReadySensor implements TwiceDifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1);
  private static final String NAME = "Pseudorange";

  private final Range range;
  private final int placeWidth;
  private final int clock;
  private final int clockColumn;
  private final boolean deviationGiven;

  /**
   * The sensor with noise that is always the same.
   *
   * @param sight in the plane or in space, without a heading
   * @param clock 1 component (m)
   * @param deviation of the noise (m), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public Pseudorange(Sight sight, Components clock, double deviation) {
    this(sight, clock, deviation, false);
  }

  private Pseudorange(Sight sight, Components clock, double deviation, boolean deviationGiven) {
    super(
        SPACE,
        sight.requireNoHeading(NAME).width() + (deviationGiven ? 1 : 0),
        SensorSetUp.structure(sight.position().columns(), clock.columns(), NAME),
        SensorSetUp.variance(deviation, "range deviation (m)", NAME));
    clock.requireCount(1, "a clock", "sensor model " + NAME);
    this.range = new Range(sight, deviation);
    this.placeWidth = sight.width();
    this.clock = clock.index(0);
    this.clockColumn = clock.column(0);
    this.deviationGiven = deviationGiven;
  }

  /**
   * The sensor with a noise that is given with each measurement, behind the place, as a standard deviation (m): satellites
   * near the horizon are heard with more noise than those overhead.
   *
   * @param sight in the plane or in space, without a heading
   * @param clock 1 component (m)
   * @return the sensor
   * @throws IllegalArgumentException if an argument is not so
   */
  public static Pseudorange ofGivenDeviation(Sight sight, Components clock) {
    return new Pseudorange(sight, clock, 1, true);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    range.measure(state, given, measurement);
    measurement[0] += state[clock];
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    range.measureJacobian(state, given, jacobian);
    jacobian[clockColumn] = 1;
  }

  @Override
  public void measureHessian(double[] state, double[] given, double[] hessians) {
    range.measureHessian(state, given, hessians);
  }

  /** A given deviation of 0 or below is refused by the filter, as no valid noise. */
  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    if (deviationGiven) {
      double deviation = given[placeWidth];
      covariance[0] = deviation * Math.abs(deviation);
    } else {
      super.measurementNoise(state, given, covariance);
    }
  }
}

package dev.estimation.filters.sensor;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableSensor;

/**
 * Length (m/s) and direction (rad) of a velocity in the plane, with independent errors: |v| and atan2(v_2, v_1). The course is
 * zero along the first component and grows towards the second, as a bearing does.
 *
 * <p>Nothing is given. At rest there is no course: measurement and derivatives are NaN, and the update is refused with a status;
 * near rest, at speeds of a few of their standard deviations, a course tells next to nothing and is far from linear.
 * <i>Immutable.</i>
 */
public final class SpeedAndCourse extends ReadySensor implements TwiceDifferentiableSensor {
  private static final FlatSpace SPACE = Space.reals(1).and(Space.angles(1));
  private static final String NAME = "SpeedAndCourse";

  private final RangeAndBearing polar;
  private final double[] rest = new double[2];

  /**
   * The sensor.
   *
   * @param velocity 2 components (m/s)
   * @param speedDeviation of the noise (m/s), finite, above 0
   * @param courseDeviation of the noise (rad), finite, above 0
   * @throws IllegalArgumentException if an argument is not so
   */
  public SpeedAndCourse(Components velocity, double speedDeviation, double courseDeviation) {
    super(
        SPACE,
        0,
        SensorSetUp.structure(velocity.columns(), new int[0], NAME),
        SensorSetUp.variance(speedDeviation, "speed deviation (m/s)", NAME),
        SensorSetUp.variance(courseDeviation, "course deviation (rad)", NAME));
    velocity.requireCount(2, "a velocity", "sensor model " + NAME);
    this.polar = new RangeAndBearing(Sight.fromGiven(velocity), speedDeviation, courseDeviation);
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    polar.measure(state, rest, measurement);
  }

  @Override
  public void measureJacobian(double[] state, double[] given, double[] jacobian) {
    polar.measureJacobian(state, rest, jacobian);
  }

  @Override
  public void measureHessian(double[] state, double[] given, double[] hessians) {
    polar.measureHessian(state, rest, hessians);
  }
}

package dev.estimation.filters.filter;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.JacobianCheck;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.TwiceDifferentiableSensor;
import dev.estimation.filters.testing.Pendulum;
import org.junit.jupiter.api.Test;

/** What models offer of derivatives arrives at the functions that are made of them. */
class ModelDerivativesTest {
  private static final Space PLANE = Space.reals(2);
  private static final double[] SCALES = {1, 1};
  private static final double[] POINT = {1.2, -0.7};

  private static void check(VectorFunction function, Space output, double... given) {
    assertTrue(function.structure().hessian().isPresent());
    JacobianCheck check = JacobianCheck.of(PLANE, output, function, SCALES, given, POINT);
    assertTrue(check.passed(), check::toString);
  }

  @Test
  void ofMotions() {
    MotionFunction function = new MotionFunction(new Pendulum());
    function.over(3, 0.5);
    check(function, PLANE);
  }

  @Test
  void ofSensors() {
    check(new SensorFunction(new Pendulum.SideView()), Space.reals(1));
    check(new SensorFunction(new Saddle()), PLANE, 0.4);
  }

  @Test
  void ofStackedSensors() {
    StackedSensor stacked = StackedSensor.of(new Saddle(), 3, PLANE);
    check(new SensorFunction(stacked), Space.reals(6), 0.4, -2, 7);
  }

  /** Two functions of two components that depend on what is given. */
  private static final class Saddle implements TwiceDifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return PLANE;
    }

    @Override
    public int givenDimension() {
      return 1;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = given[0] * state[0] * state[1];
      measurement[1] = Math.sin(state[0] + given[0]);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[0] = given[0] * state[1];
      jacobian[1] = given[0] * state[0];
      jacobian[2] = Math.cos(state[0] + given[0]);
    }

    @Override
    public void measureHessian(double[] state, double[] given, double[] hessians) {
      hessians[2] = given[0];
      hessians[4] = -Math.sin(state[0] + given[0]);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 1;
      covariance[3] = 1;
    }
  }
}

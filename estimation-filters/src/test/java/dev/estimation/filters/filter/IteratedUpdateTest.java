package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.RangeAndBearing;
import dev.estimation.filters.sensor.Sight;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Models;
import dev.estimation.filters.testing.PlainWalk;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Iterated updates against worked examples: the maximum of the posterior density, found at extended
 * precision with a gradient of 7e-33 by an independent program, and its Gauss-Newton covariance.
 */
class IteratedUpdateTest extends BothForms {
  private static final Gaussian PLANE =
      Gaussian.of(new double[] {10, 5}, new double[][] {{4, 1}, {1, 9}});
  private static final double[] SIGHT = {12.3, 0.6};
  private static final double[] ORIGIN = {0, 0};
  private static final RangeAndBearing RADAR =
      new RangeAndBearing(Sight.fromGiven(Components.of(0, 1)), 0.1, 0.02);
  private static final Gaussian SCALAR = Gaussian.of(new double[] {1}, new double[][] {{0.5}});

  static List<IteratedUpdate> settings() {
    return List.of(
        IteratedUpdate.undamped().withTolerance(1e-14),
        IteratedUpdate.lineSearch().withTolerance(1e-14));
  }

  private SensorPort port(int dimension, IteratedUpdate iteration, DifferentiableSensor s) {
    return formed(FilterPlan.iteratedExtended(new PlainWalk(dimension, 1), iteration))
        .workspace()
        .port(s);
  }

  private Estimate start(Gaussian prior) {
    return formed(FilterPlan.extended(new PlainWalk(prior.dimension(), 1))).start(0, prior);
  }

  /** 1e-12 standard deviations (2 m, 3 m): the tolerance asked of the iteration is 1e-14. */
  @ParameterizedTest
  @MethodSource("settings")
  void rangeAndBearing(IteratedUpdate iteration) {
    Estimate estimate = start(PLANE);
    SensorPort port = port(2, iteration, RADAR);
    assertEquals(StepStatus.APPLIED, port.update(estimate, SIGHT, ORIGIN));
    assertWithin("east", 10.157116827533569, estimate.mean(0), 1e-12, 2);
    assertWithin("north", 6.9351242595186475, estimate.mean(1), 1e-12, 3);
    assertWithin("P11", 0.025788992911124325, estimate.covariance(0, 0), 1e-12, 1);
    assertWithin("P12", -0.0231973595341698, estimate.covariance(1, 0), 1e-12, 1);
    assertWithin("P22", 0.04402347625951449, estimate.covariance(1, 1), 1e-12, 1);
  }

  @ParameterizedTest
  @MethodSource("settings")
  void cube(IteratedUpdate iteration) {
    Estimate estimate = start(SCALAR);
    SensorPort port = port(1, iteration, new Models.Cube(0.04));
    assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {3}));
    assertWithin("mean", 1.4413411620618262, estimate.mean(0), 1e-12, 1);
    assertWithin("variance", 0.0010276773298063496, estimate.covariance(0, 0), 1e-12, 1);
  }

  /** After i rounds the undamped iteration stands at the i-th published iterate. */
  @Test
  void roundsAreThoseOfTheExample() {
    double[][] iterates = {
      {10.322401677273868, 6.856206128479499},
      {10.157411209257832, 6.936537984684144},
      {10.157117015373549, 6.935123785971928}
    };
    for (int i = 0; i < iterates.length; i++) {
      // The tolerance lets the round end that starts from iterate i: its step is below 2 there.
      double stop = i == 0 ? 2 : i == 1 ? 0.2 : 1e-3;
      IteratedUpdate iteration = IteratedUpdate.undamped().withTolerance(stop);
      Estimate estimate = start(PLANE);
      SensorPort port = port(2, iteration, RADAR);
      assertEquals(StepStatus.APPLIED, port.update(estimate, SIGHT, ORIGIN));
      assertWithin("round " + i, iterates[i][0], estimate.mean(0), 1e-12, 2);
      assertWithin("round " + i, iterates[i][1], estimate.mean(1), 1e-12, 3);
    }
  }

  /** Gate, NIS and likelihood come from the first linearisation. */
  @Test
  void innovationIsThatOfThePrediction() {
    SensorPort once =
        formed(FilterPlan.extended(new PlainWalk(2, 1))).workspace().port(RADAR);
    SensorPort often = port(2, IteratedUpdate.undamped(), RADAR);
    assertEquals(StepStatus.APPLIED, once.update(start(PLANE), SIGHT, ORIGIN));
    assertEquals(StepStatus.APPLIED, often.update(start(PLANE), SIGHT, ORIGIN));
    assertEquals(once.normalisedInnovationSquared(), often.normalisedInnovationSquared());
    assertEquals(once.logLikelihood(), often.logLikelihood());
    assertArrayEquals(once.innovation(), often.innovation());
    assertArrayEquals(once.innovationCovariance().data, often.innovationCovariance().data);
  }

  /** A linear sensor is settled after one round. */
  @Test
  void linearSensorNeedsNoIteration() {
    Estimate estimate = start(SCALAR);
    SensorPort port = port(1, IteratedUpdate.undamped(), new Slope());
    assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {2}));
    assertEquals(3, port.jacobians(), "at the prior, after the step, after a step of nothing");
    assertWithin("mean", 1 + 0.5 * 1 / (0.5 + 1), estimate.mean(0), 1e-15, 1);
  }

  /**
   * Full steps on z = arctan(x) overshoot from side to side for ever when the measurement is much
   * better than the prior (a textbook failure of Newton's method); the line search settles where the
   * slope of the cost is zero.
   */
  @Test
  void undampedStepsThatCircleAreToldApart() {
    Gaussian wide = Gaussian.of(new double[] {2}, new double[][] {{1}});
    Estimate estimate = start(wide);
    long[] before = Bits.of(estimate, 1);
    SensorPort undamped = port(1, IteratedUpdate.undamped(), new ArcTangent());
    assertEquals(StepStatus.NOT_CONVERGED, undamped.update(estimate, new double[] {0}));
    assertArrayEquals(before, Bits.of(estimate, 1));
    assertNames(undamped.failure(), "did not converge", "ArcTangent");

    SensorPort damped = port(1, IteratedUpdate.lineSearch(), new ArcTangent());
    assertEquals(StepStatus.APPLIED, damped.update(estimate, new double[] {0}));
    double x = estimate.mean(0);
    double slope = (x - 2) + Math.atan(x) / (1 + x * x) / 1e-4;
    // Tolerance 1e-9: x is right to that, the slope to that times the curvature of 1e4.
    assertTrue(Math.abs(slope) < 1e-5, "slope " + slope + " at " + x);
  }

  @Test
  void badSettingsAreRefused() {
    assertThrows(IllegalArgumentException.class, () -> IteratedUpdate.undamped().withTolerance(0));
    assertThrows(
        IllegalArgumentException.class, () -> IteratedUpdate.undamped().withMaximumRounds(0));
  }

  /** Sees a scalar as it is, variance 1. */
  private record Slope() implements DifferentiableSensor {
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
  }

  /** The arc tangent of a scalar, variance 1e-4. */
  private record ArcTangent() implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = Math.atan(state[0]);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[0] = 1 / (1 + state[0] * state[0]);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 1e-4;
    }
  }
}

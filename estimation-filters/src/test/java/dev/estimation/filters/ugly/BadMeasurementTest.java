package dev.estimation.filters.ugly;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.FaultySensor;
import dev.estimation.filters.testing.FaultySensor.Fault;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.filters.testing.PlainWalk;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.Parameter;
import org.junit.jupiter.params.ParameterizedClass;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** A bad measurement or sensor model is told apart, and changes nothing at all. */
@ParameterizedClass
@MethodSource("matchings")
class BadMeasurementTest {
  @Parameter(0)
  MomentMatching matching;

  @Parameter(1)
  Form form;

  private final FaultySensor sensor = new FaultySensor();
  private FilterPlan plan;
  private SensorPort port;
  private Estimate estimate;

  static List<Arguments> matchings() {
    MomentMatching points = PointMatching.of(UnscentedRule.scaled(1, 2, 0));
    return List.of(
        Arguments.of(Linearisation.firstOrder(), Form.COVARIANCE),
        Arguments.of(Linearisation.firstOrder(), Form.SQUARE_ROOT),
        Arguments.of(points, Form.COVARIANCE),
        Arguments.of(points, Form.SQUARE_ROOT));
  }

  private FilterPlan plan() {
    return BothForms.formed(FilterPlan.of(new PlainWalk(3, 1), matching), form);
  }

  @BeforeEach
  void start() {
    plan = plan().withGate(0.999);
    port = plan.workspace().port(sensor);
    estimate = plan.start(10, Gaussian.independent(new double[] {1, 2, 3}, new double[] {1, 2, 3}));
  }

  private void refused(StepStatus wanted, double[] measurement, String... words) {
    long[] before = Bits.of(estimate, 3);
    assertEquals(wanted, port.update(estimate, measurement));
    assertArrayEquals(before, Bits.of(estimate, 3), "estimate changed");
    for (String word : words) {
      assertTrue(port.failure().contains(word), () -> port.failure() + " lacks " + word);
    }
    worksAfterwards();
  }

  /** The port gives the bits of a port that never failed. */
  private void worksAfterwards() {
    sensor.set(Fault.NONE);
    Estimate one = plan.start(10, estimate.toGaussian());
    Estimate other = plan.start(10, estimate.toGaussian());
    assertEquals(StepStatus.APPLIED, port.update(one, new double[] {1.5, 2.5}));
    assertEquals("", port.failure());
    SensorPort fresh = plan.workspace().port(new FaultySensor());
    assertEquals(StepStatus.APPLIED, fresh.update(other, new double[] {1.5, 2.5}));
    assertArrayEquals(Bits.of(other, 3), Bits.of(one, 3));
  }

  @ParameterizedTest
  @CsvSource({"NaN, 0", "0, NaN", "Infinity, 0", "0, -Infinity"})
  void measurementThatIsNotFinite(double first, double second) {
    double bad = Double.isFinite(first) ? second : first;
    refused(
        StepStatus.INPUT_NOT_FINITE,
        new double[] {first, second},
        "measurement[" + (Double.isFinite(first) ? 1 : 0) + "]",
        "got " + bad,
        "FaultySensor",
        "t = 10.0 s");
  }

  @ParameterizedTest
  @CsvSource({
    "NAN, 'output[0] of 2 must be finite, got NaN'",
    "INFINITE, 'output[1] of 2 must be finite, got Infinity'",
    "UNFILLED, 'output[1] of 2 was not filled'"
  })
  void modelThatIsNotFinite(Fault fault, String words) {
    sensor.set(fault);
    refused(StepStatus.MODEL_NOT_FINITE, new double[] {1, 2}, words, "FaultySensor");
  }

  @ParameterizedTest
  @CsvSource({
    "NAN_NOISE, 'measurementNoise[1][1] must be finite and > 0, got NaN'",
    "ZERO_NOISE, 'measurementNoise[1][1] must be finite and > 0, got 0.0'",
    "NEGATIVE_NOISE, 'measurementNoise[0][0] must be finite and > 0, got -1.0E-9'",
    "ASYMMETRIC_NOISE, 'measurementNoise must be symmetric, got measurementNoise[1][0] = 0.0'",
    "INDEFINITE_NOISE, 'measurementNoise is not positive definite: pivot 2 of 2 is -3.0'"
  })
  void noiseThatIsNotACovariance(Fault fault, String words) {
    sensor.set(fault);
    refused(StepStatus.NOISE_NOT_VALID, new double[] {1, 2}, words, "FaultySensor");
  }

  @Test
  void modelThatThrows() {
    sensor.set(Fault.THROWS);
    long[] before = Bits.of(estimate, 3);
    assertThrows(IllegalStateException.class, () -> port.update(estimate, new double[] {1, 2}));
    assertArrayEquals(before, Bits.of(estimate, 3));
    worksAfterwards();
  }

  @Test
  void outlierIsGated() {
    // Innovation 100 against standard deviations sqrt(2) and sqrt(5): NIS 10000/2 + 10000/5.
    assertEquals(StepStatus.GATED, port.update(estimate, new double[] {101, 102}));
    assertEquals(7000, port.normalisedInnovationSquared(), 1e-11, "a few roundings of 7000");
    refused(StepStatus.GATED, new double[] {101, 102}, "is above the gate 13.8155");
  }

  @Test
  void absurdMeasurementWithoutGateOverflows() {
    port = plan().workspace().port(sensor);
    long[] before = Bits.of(estimate, 3);
    assertEquals(
        StepStatus.RESULT_NOT_FINITE,
        port.update(estimate, new double[] {Double.MAX_VALUE, -Double.MAX_VALUE}));
    assertArrayEquals(before, Bits.of(estimate, 3));
    assertTrue(port.failure().contains("not finite"), port.failure());
  }

  @Test
  void wrongShapesThrow() {
    String message = assertThrows(
            IllegalArgumentException.class, () -> port.update(estimate, new double[] {1}))
        .getMessage();
    assertEquals("measurement must have length 2, got 1", message);
    message = assertThrows(
            IllegalArgumentException.class,
            () -> port.update(estimate, new double[2], new double[3]))
        .getMessage();
    assertEquals("given must have length 0, got 3", message);
    Estimate foreign = FilterPlan.of(new PlainWalk(2, 1), matching)
        .start(0, Gaussian.independent(new double[2], new double[2]));
    message = assertThrows(
            IllegalArgumentException.class, () -> port.update(foreign, new double[2]))
        .getMessage();
    assertTrue(message.contains("(real, real, real)"), message);
  }

  @Test
  void jacobianThatIsNotFinite() {
    sensor.set(Fault.NAN_JACOBIAN);
    if (matching instanceof Linearisation) {
      refused(
          StepStatus.MODEL_NOT_FINITE,
          new double[] {1, 2},
          "Jacobian[1][1] must be finite, got NaN");
    } else {
      assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {1, 2}));
    }
  }

  @Test
  void linearisationWithoutJacobianIsRefusedAtSetUp() {
    String message = assertThrows(
            IllegalArgumentException.class,
            () -> FilterPlan.extended(new PlainWalk(3, 1)).workspace().port(new NoJacobian()))
        .getMessage();
    assertTrue(message.contains("Jacobian"), message);
  }

  /** A sensor that knows no derivative. */
  private static final class NoJacobian implements dev.estimation.filters.model.SensorModel {
    private final PlainPosition position = new PlainPosition(3, 1);

    @Override
    public dev.estimation.core.space.Space measurementSpace() {
      return position.measurementSpace();
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      position.measure(state, given, measurement);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      position.measurementNoise(state, given, covariance);
    }
  }
}

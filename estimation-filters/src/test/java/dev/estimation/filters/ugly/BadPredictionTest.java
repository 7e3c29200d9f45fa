package dev.estimation.filters.ugly;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.FaultyMotion;
import dev.estimation.filters.testing.FaultyMotion.Fault;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** A bad time, control or motion model is told apart, and changes nothing at all. */
class BadPredictionTest extends BothForms {
  private static final double[] CONTROL = {1, -1};

  private final FaultyMotion motion = new FaultyMotion();
  private FilterPlan plan;
  private FilterWorkspace work;
  private Estimate estimate;

  @BeforeEach
  void start() {
    plan = formed(FilterPlan.unscented(motion, 1, 2, 0));
    work = plan.workspace();
    estimate = plan.start(10, Gaussian.independent(new double[] {1, 2}, new double[] {1, 2}));
  }

  private void refused(StepStatus wanted, double time, double[] control, String... words) {
    long[] before = Bits.of(estimate, 2);
    assertEquals(wanted, work.predict(estimate, time, control));
    assertArrayEquals(before, Bits.of(estimate, 2), "estimate changed");
    for (String word : words) {
      assertTrue(work.failure().contains(word), () -> work.failure() + " lacks " + word);
    }
    worksAfterwards();
  }

  private void worksAfterwards() {
    motion.set(Fault.NONE);
    Estimate one = plan.start(10, estimate.toGaussian());
    Estimate other = plan.start(10, estimate.toGaussian());
    assertEquals(StepStatus.APPLIED, work.predict(one, 12, CONTROL));
    assertEquals("", work.failure());
    assertEquals(StepStatus.APPLIED, plan.workspace().predict(other, 12, CONTROL));
    assertArrayEquals(Bits.of(other, 2), Bits.of(one, 2));
  }

  @Test
  void timeBeforeTheEstimate() {
    refused(
        StepStatus.TIME_BEFORE_ESTIMATE,
        9.98,
        CONTROL,
        "step to t = 9.98 s lies before the estimate at t = 10.0 s",
        "FaultyMotion");
  }

  @ParameterizedTest
  @CsvSource({"NaN", "Infinity", "-Infinity"})
  void timeThatIsNotFinite(double time) {
    refused(StepStatus.TIME_NOT_FINITE, time, CONTROL, "time must be finite, got " + time);
  }

  @Test
  void controlThatIsNotFinite() {
    refused(
        StepStatus.INPUT_NOT_FINITE,
        11,
        new double[] {0, Double.NaN},
        "control[1] must be finite, got NaN");
  }

  @ParameterizedTest
  @CsvSource({
    "NAN, 'output[0] of 2 must be finite, got NaN'",
    "UNFILLED, 'output[1] of 2 was not filled'"
  })
  void modelThatIsNotFinite(Fault fault, String words) {
    motion.set(fault);
    refused(StepStatus.MODEL_NOT_FINITE, 11, CONTROL, words, "FaultyMotion", "11.0 s");
  }

  @ParameterizedTest
  @CsvSource({
    "NAN_NOISE, 'processNoise[1][1] must be finite and >= 0, got NaN'",
    "NEGATIVE_NOISE, 'processNoise[1][1] must be finite and >= 0, got -1.0E-9'",
    "ASYMMETRIC_NOISE, 'processNoise must be symmetric, got processNoise[1][0] = 0.5'",
    "INDEFINITE_NOISE, 'processNoise is not positive semi-definite: pivot 2 of 2 is -3.0'"
  })
  void noiseThatIsNotACovariance(Fault fault, String words) {
    motion.set(fault);
    refused(StepStatus.NOISE_NOT_VALID, 11, CONTROL, words);
  }

  @Test
  void modelThatThrows() {
    motion.set(Fault.THROWS);
    long[] before = Bits.of(estimate, 2);
    assertThrows(IllegalStateException.class, () -> work.predict(estimate, 11, CONTROL));
    assertArrayEquals(before, Bits.of(estimate, 2));
    worksAfterwards();
  }

  @Test
  void controlOfWrongLengthThrows() {
    String message = assertThrows(
            IllegalArgumentException.class, () -> work.predict(estimate, 11, new double[1]))
        .getMessage();
    assertEquals("control must have length 2, got 1", message);
    assertThrows(IllegalArgumentException.class, () -> work.predict(estimate, 11));
  }

  /** A variance of 1e308 and a process noise of 1.7e308 are finite, their sum is not. */
  @Test
  void varianceThatOverflowsIsRefused() {
    double[] huge = {1e154, 1e154};
    Estimate vague = plan.start(0, Gaussian.independent(new double[2], huge));
    long[] before = Bits.of(vague, 2);
    assertEquals(StepStatus.RESULT_NOT_FINITE, work.predict(vague, 1.7e308, new double[2]));
    assertArrayEquals(before, Bits.of(vague, 2));
    assertTrue(work.failure().contains("overflow"), work.failure());
  }

  @Test
  void noTimeAtAllChangesNothing() {
    long[] before = Bits.of(estimate, 2);
    assertEquals(StepStatus.APPLIED, work.predict(estimate, 10, CONTROL));
    assertEquals(0, work.evaluations());
    assertArrayEquals(before, Bits.of(estimate, 2));
  }

  @Test
  void startChecksItsArguments() {
    Gaussian three = Gaussian.independent(new double[3], new double[3]);
    String message =
        assertThrows(IllegalArgumentException.class, () -> plan.start(0, three)).getMessage();
    assertTrue(message.contains("2") && message.contains("3"), message);
    Gaussian two = Gaussian.independent(new double[2], new double[2]);
    assertThrows(IllegalArgumentException.class, () -> plan.start(Double.NaN, two));
    assertThrows(IllegalArgumentException.class, () -> plan.withGate(1));
    assertThrows(IllegalArgumentException.class, () -> plan.withGate(Double.NaN));
  }
}

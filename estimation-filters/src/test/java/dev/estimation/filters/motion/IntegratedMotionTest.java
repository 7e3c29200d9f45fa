package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.Flows;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class IntegratedMotionTest {
  private static final double[] NONE = {};

  /** F and Q of the closed forms, each entry to 1e-10 of itself, with tolerances of 1e-13. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-3, 0.5, 4, 30})
  void linearMotionsEqualTheirClosedForms(double dt) {
    DifferentiableMotion straight =
        IntegratedMotion.of(new Flows.Straight(0.3), 1e-13, 1e-13, 1e-13);
    checkEqual(new ConstantVelocity(0.3), straight, new double[] {100, -3}, dt);
    DifferentiableMotion fading =
        IntegratedMotion.of(new Flows.Fading(5, 0.3), 1e-13, 1e-13, 1e-13, 1e-13);
    checkEqual(new CorrelatedAcceleration(5, 0.3), fading, new double[] {100, -3, 0.5}, dt);
  }

  private static void checkEqual(
      DifferentiableMotion closed, DifferentiableMotion integrated, double[] state, double dt) {
    checkEqual(
        MotionFunctions.moved(closed, state, NONE, dt),
        MotionFunctions.moved(integrated, state, NONE, dt));
    checkEqual(
        MotionFunctions.jacobian(closed, state, NONE, dt),
        MotionFunctions.jacobian(integrated, state, NONE, dt));
    checkEqual(
        MotionFunctions.noise(closed, state, NONE, dt),
        MotionFunctions.noise(integrated, state, NONE, dt));
  }

  private static void checkEqual(double[] expected, double[] got) {
    for (int i = 0; i < expected.length; i++) {
      assertEquals(expected[i], got[i], 1e-10 * Math.abs(expected[i]), "entry " + i);
    }
  }

  /**
   * x' = c x + t from t0: x = (x0 + t0/c + 1/c^2) e^(c dt) - (t0 + dt)/c - 1/c^2; Phi = e^(c dt); Q' = 2 c Q + t:
   * Q = (t0/(2c) + 1/(4c^2)) e^(2 c dt) - (t0 + dt)/(2c) - 1/(4c^2). Differences give A to 1e-10, Phi and Q to few times that.
   */
  @Test
  void timeAndControlAreThoseOfTheStep() {
    DifferentiableMotion forced =
        IntegratedMotion.withDifferences(new Flows.Forced(), new double[] {1}, 1e-9, 1e-9);
    double c = -0.4;
    double start = 7;
    double dt = 3;
    double[] control = {c};
    double[] state = {2};
    double[] got = new double[1];
    forced.move(state, control, start, dt, got);
    double particular = start / c + 1 / (c * c);
    double rest = (start + dt) / c + 1 / (c * c);
    assertEquals((2 + particular) * Math.exp(c * dt) - rest, got[0], 1e-7);
    forced.moveJacobian(state, control, start, dt, got);
    assertEquals(Math.exp(c * dt), got[0], 1e-8);
    forced.processNoise(state, control, start, dt, got);
    double k = 2 * c;
    double noise = (start / k + 1 / (k * k)) * Math.exp(k * dt) - (start + dt) / k - 1 / (k * k);
    assertEquals(noise, got[0], 1e-7);
  }

  /** The clock may read a billion seconds: the integrator counts from the start of the step. */
  @Test
  void aLateTimeLosesNothing() {
    DifferentiableMotion straight = IntegratedMotion.of(new Flows.Straight(1), 1e-12, 1e-9, 1e-9);
    double[] next = new double[2];
    straight.move(new double[] {1, 2}, NONE, 1.7e9, 1e-7, next);
    assertArrayEquals(new double[] {1 + 2e-7, 2}, next, 1e-15);
  }

  @Test
  void differencesGiveTheJacobianThatTheModelKnows() {
    FallingBody body = new FallingBody(5e-5, 32.2, 0.5, 1e-12);
    DifferentiableMotion known = IntegratedMotion.of(body, 1e-9, 1e-4, 1e-6, 1e-12);
    DifferentiableMotion differenced = IntegratedMotion.withDifferences(
        body, new double[] {2e4, 1e3, 1e-3}, 1e-9, 1e-4, 1e-6, 1e-12);
    double[] state = {1e5, 1e4, 1e-3};
    double[] expected = MotionFunctions.jacobian(known, state, NONE, 2);
    double[] got = MotionFunctions.jacobian(differenced, state, NONE, 2);
    double[] noise = MotionFunctions.noise(known, state, NONE, 2);
    double[] gotNoise = MotionFunctions.noise(differenced, state, NONE, 2);
    for (int i = 0; i < 9; i++) {
      assertEquals(expected[i], got[i], 1e-7 * Math.abs(expected[i]), "F entry " + i);
      assertEquals(noise[i], gotNoise[i], 1e-7 * Math.abs(noise[i]), "Q entry " + i);
    }
  }

  /** Two tolerances, two errors: 1000 times coarser is visibly worse, and both keep what they promise. */
  @Test
  void toleranceIsKept() {
    double fine = error(1e-10);
    double coarse = error(1e-4);
    assertTrue(fine < 1e-8, "fine " + fine);
    assertTrue(coarse < 1e-2 && coarse > 10 * fine, "coarse " + coarse);
  }

  /** Of x after 200 s in one step, against the exact 100 e^-10, x' = -x / 20. */
  private static double error(double tolerance) {
    DifferentiableMotion decay = IntegratedMotion.of(new Flows.Stiff(0.05), tolerance, tolerance);
    double[] end = MotionFunctions.moved(decay, new double[] {100}, NONE, 200);
    return Math.abs(end[0] - 100 * Math.exp(-10));
  }

  /** x' = x^2 from 1 is at infinity after 1 s; with a limit there is no number beyond it; stiff takes too long. */
  @Test
  void whatCannotBeReachedIsNotANumber() {
    checkNaN(IntegratedMotion.of(new Flows.Explosive(Double.MAX_VALUE), 1e-9, 1e-9));
    checkNaN(IntegratedMotion.of(new Flows.Explosive(1.5), 1e-9, 1e-9));
    checkNaN(IntegratedMotion.of(new Flows.Stiff(1e9), 1e-9, 1e-9));
  }

  private static void checkNaN(DifferentiableMotion motion) {
    double[] one = {1};
    double[] lost = {Double.NaN};
    assertArrayEquals(lost, MotionFunctions.moved(motion, one, NONE, 2));
    assertArrayEquals(lost, MotionFunctions.jacobian(motion, one, NONE, 2));
    assertArrayEquals(lost, MotionFunctions.noise(motion, one, NONE, 2));
  }

  /** The path of the mean fails first in the noise; that of a sigma point in the move. */
  @Test
  void aFilterEndsWithAStatus() {
    IntegratedMotion motion =
        IntegratedMotion.of(new Flows.Explosive(Double.MAX_VALUE), 1e-9, 1e-9);
    checkStatus(FilterPlan.extended(motion), 1, StepStatus.NOISE_NOT_VALID);
    checkStatus(FilterPlan.unscented(motion, 1, 2, 0), 1, StepStatus.NOISE_NOT_VALID);
    checkStatus(FilterPlan.unscented(motion, 1, 2, 0), 0.3, StepStatus.MODEL_NOT_FINITE);
    checkStatus(FilterPlan.extended(motion), 0.3, StepStatus.APPLIED);
  }

  private static void checkStatus(FilterPlan plan, double mean, StepStatus expected) {
    FilterWorkspace work = plan.workspace();
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[] {mean}, new double[] {0.4}));
    long[] before = Bits.of(estimate, 1);
    assertEquals(expected, work.predict(estimate, 2), work::failure);
    if (expected != StepStatus.APPLIED) {
      assertArrayEquals(before, Bits.of(estimate, 1));
    }
  }

  /** Mean and covariance by linearisation and by sigma points: of a linear motion both are exact. */
  @Test
  void filtersOnALinearFlowAgreeWithTheClosedForm() {
    IntegratedMotion fading =
        IntegratedMotion.of(new Flows.Fading(5, 0.3), 1e-12, 1e-12, 1e-12, 1e-12);
    Gaussian expected = predicted(FilterPlan.extended(new CorrelatedAcceleration(5, 0.3)));
    for (FilterPlan plan :
        new FilterPlan[] {FilterPlan.extended(fading), FilterPlan.unscented(fading, 1, 2, 0)}) {
      Gaussian got = predicted(plan);
      assertArrayEquals(expected.mean(), got.mean(), 1e-8); // 1e-10 of 100
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          double value = expected.covariance(i, j);
          assertEquals(value, got.covariance(i, j), 1e-10 * Math.abs(value));
        }
      }
    }
  }

  private static Gaussian predicted(FilterPlan plan) {
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[] {100, -3, 0.5}, new double[] {10, 2, 1}));
    assertEquals(StepStatus.APPLIED, plan.workspace().predict(estimate, 4));
    return estimate.toGaussian();
  }

  @Test
  void aQuaternionIsRefused() {
    String message = assertThrows(
            IllegalArgumentException.class, () -> IntegratedMotion.of(new Turning(), 1e-9, 1, 1, 1))
        .getMessage();
    assertTrue(
        message.contains("reals and angles") && message.contains("unit quaternion"), message);
  }

  private record Turning() implements DifferentiableContinuousMotion {
    @Override
    public Space stateSpace() {
      return Space.unitQuaternion();
    }

    @Override
    public void drift(double[] state, double[] control, double time, double[] rate) {
      throw new AssertionError("not asked");
    }

    @Override
    public void driftJacobian(double[] state, double[] control, double time, double[] jacobian) {
      throw new AssertionError("not asked");
    }

    @Override
    public void noiseDensity(double[] state, double[] control, double time, double[] density) {
      throw new AssertionError("not asked");
    }
  }
}

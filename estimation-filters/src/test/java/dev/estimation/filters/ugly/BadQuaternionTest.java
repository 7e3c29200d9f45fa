package dev.estimation.filters.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.consistency.NormalisedError;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.IteratedUpdate;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.motion.GyroscopeAttitude;
import dev.estimation.filters.testing.Attitude;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Quaternions that are none: zero, NaN, of the wrong length, from outside and from models. */
class BadQuaternionTest extends BothForms {
  private static final GyroscopeAttitude MOTION = new GyroscopeAttitude(1e-4, 1e-6);
  private static final double[] MEAN = {1, 0, 0, 0, 0, 0, 0};
  private static final double[] DEVIATIONS = {0.1, 0.1, 0.1, 0.01, 0.01, 0.01};
  private static final Gaussian START = Gaussian.independent(Attitude.SPACE, MEAN, DEVIATIONS);

  static List<Named<MomentMatching>> matchings() {
    return Matchings.overActiveInputs();
  }

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  @Test
  void theFirstEstimateMustBeAPoint() {
    FilterPlan plan = formed(FilterPlan.unscented(MOTION, 1, 2, 0));
    Gaussian seven = Gaussian.independent(MEAN, new double[7]);
    assertRefused(() -> plan.start(0, seven), "dimension 6", "7");
    Gaussian six = Gaussian.independent(new double[6], new double[6]);
    assertRefused(() -> plan.start(0, six), "unit quaternion", "[0.0, 0.0, 0.0, 0.0, 0.0, 0.0]");
    // Bias and quaternion the wrong way round, which shows unless the bias has length 1.
    Gaussian swapped = Gaussian.independent(
        Space.reals(3).and(Space.unitQuaternion()),
        new double[] {0, 0, 0, 0.6, 0.8, 0, 0},
        DEVIATIONS);
    assertRefused(() -> plan.start(0, swapped), "(unit quaternion) x (real, real, real)", "0.6");
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void aMeasuredQuaternionMustBeOne(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(MOTION, matching));
    SensorPort port = plan.workspace().port(new Attitude.Camera(0.01));
    Estimate estimate = plan.start(0, START);
    long[] before = Bits.of(estimate, 6);
    assertEquals(StepStatus.INPUT_NOT_FINITE, port.update(estimate, new double[4]));
    assertNames(port.failure(), "measurement", "point of (unit quaternion)", "Camera");
    assertEquals(StepStatus.INPUT_NOT_FINITE, port.update(estimate, new double[] {2, 0, 0, 0}));
    double[] broken = {1, 0, Double.NaN, 0};
    assertEquals(StepStatus.INPUT_NOT_FINITE, port.update(estimate, broken));
    assertNames(port.failure(), "measurement[2]", "finite", "NaN");
    assertRefused(() -> port.update(estimate, new double[3]), "measurement", "4", "3");
    assertArrayEquals(before, Bits.of(estimate, 6), "estimate changed");
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void aModelThatMovesToZeroIsRefused(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new ToZero(), matching));
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, START);
    long[] before = Bits.of(estimate, 6);
    assertEquals(StepStatus.RESULT_NOT_FINITE, work.predict(estimate, 1));
    assertNames(work.failure(), "not finite", "unit quaternion", "ToZero");
    assertArrayEquals(before, Bits.of(estimate, 6), "estimate changed");
  }

  @Test
  void whatTakesOnlyRealsAndAnglesSaysSo() {
    assertRefused(
        () -> formed(FilterPlan.iteratedExtended(MOTION, IteratedUpdate.undamped())),
        "reals and angles",
        "unit quaternion",
        "GyroscopeAttitude");
    NormalisedError error = NormalisedError.of(Attitude.SPACE, 0, 1, 2);
    assertRefused(() -> error.squared(START, new double[3]), "unit quaternion", "squaredFrom");
    assertRefused(() -> error.squaredFrom(START, new double[6]), "7", "6");
    Gaussian six = Gaussian.independent(new double[6], DEVIATIONS);
    assertRefused(() -> error.squaredFrom(six, MEAN), "7 numbers", "6 and 6");
  }

  /** Forgets to fill the quaternion with anything but zeros. */
  private static final class ToZero implements DifferentiableMotion {
    @Override
    public Space stateSpace() {
      return Attitude.SPACE;
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      Arrays.fill(next, 0);
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      jacobian[0] = 1;
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      for (int i = 0; i < 6; i++) {
        covariance[i * 7] = 1;
      }
    }
  }
}

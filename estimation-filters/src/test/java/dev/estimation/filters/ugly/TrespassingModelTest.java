package dev.estimation.filters.ugly;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Models that write on the state they are given, against their contract, and fail or not. */
class TrespassingModelTest extends BothForms {
  private static final Gaussian START =
      Gaussian.of(new double[] {1, 2}, new double[][] {{1, 0.2}, {0.2, 2}});

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void motion(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new Scribbler(), matching));
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, START);
    long[] before = Bits.of(estimate, 2);
    assertEquals(StepStatus.MODEL_NOT_FINITE, work.predict(estimate, 1));
    assertArrayEquals(before, Bits.of(estimate, 2));
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void sensor(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new Scribbler(), matching));
    SensorPort port = plan.workspace().port(new Defacer());
    Estimate estimate = plan.start(0, START);
    long[] before = Bits.of(estimate, 2);
    assertEquals(StepStatus.MODEL_NOT_FINITE, port.update(estimate, new double[] {1}));
    assertArrayEquals(before, Bits.of(estimate, 2));
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void isToldWhereNothingElseIsWrong(MomentMatching matching) {
    FilterPlan plan = FilterPlan.of(new Scribbler(), matching);
    SensorPort port = plan.workspace().port(new Smudger());
    Estimate estimate = plan.start(0, START);
    long[] before = Bits.of(estimate, 2);
    assertEquals(StepStatus.MODEL_CHANGED_INPUT, port.update(estimate, new double[] {1}));
    assertTrue(port.failure().contains("input[1]") && port.failure().contains("Smudger"));
    assertArrayEquals(before, Bits.of(estimate, 2));
  }

  /** Writes on one component after it has read it. */
  private static final class Smudger implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = state[0];
      state[1] = 0;
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

  /** Writes on the state everywhere; its motion is NaN. */
  private static final class Scribbler implements DifferentiableMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(2);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      Arrays.fill(state, -7);
      next[0] = 1;
      next[1] = Double.NaN;
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      Arrays.fill(state, -7);
      jacobian[0] = 1;
      jacobian[3] = 1;
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      Arrays.fill(state, -7);
      covariance[0] = 1;
      covariance[3] = 1;
    }
  }

  /** Writes on the state everywhere; its measurement is infinite. */
  private static final class Defacer implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      Arrays.fill(state, -7);
      measurement[0] = Double.POSITIVE_INFINITY;
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      Arrays.fill(state, -7);
      jacobian[0] = 1;
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      Arrays.fill(state, -7);
      covariance[0] = 1;
    }
  }
}

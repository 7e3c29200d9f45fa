package dev.estimation.filters.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.IteratedUpdate;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Models that keep the noise array they filled, and write on it while moments are carried. */
class NoiseKeepingModelTest extends BothForms {
  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  /** Two steps, so that what is written late would also meet the next; estimate and likelihood. */
  private static long[] follow(FilterPlan plan, boolean keeps) {
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(new Sight(keeps));
    Estimate estimate =
        plan.start(0, Gaussian.of(new double[] {1, 2}, new double[][] {{1, 0.2}, {0.2, 2}}));
    for (int k = 1; k <= 2; k++) {
      assertEquals(StepStatus.APPLIED, work.predict(estimate, k), work::failure);
      assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {k}), port::failure);
    }
    long[] bits = Arrays.copyOf(Bits.of(estimate, 2), 8);
    bits[7] = Double.doubleToRawLongBits(port.logLikelihood());
    return bits;
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void addedNoise(MomentMatching matching) {
    assertArrayEquals(
        follow(formed(FilterPlan.of(new Drift(false), matching)), false),
        follow(formed(FilterPlan.of(new Drift(true), matching)), false));
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void noiseInside(MomentMatching matching) {
    assertArrayEquals(
        follow(formed(FilterPlan.of(new Gust(false, 2), matching)), false),
        follow(formed(FilterPlan.of(new Gust(true, 2), matching)), false));
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void measurementNoise(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new Drift(false), matching));
    assertArrayEquals(follow(plan, false), follow(plan, true));
  }

  @Test
  void measurementNoiseOfAnIteratedUpdate() {
    FilterPlan plan =
        formed(FilterPlan.iteratedExtended(new Drift(false), IteratedUpdate.lineSearch()));
    assertArrayEquals(follow(plan, false), follow(plan, true));
  }

  /** The plan is refused, not its first step; the message says which model and what it said. */
  @ParameterizedTest
  @MethodSource("matchings")
  void noNoiseAtAll(MomentMatching matching) {
    for (int dimension : new int[] {0, -1}) {
      Motion gust = new Gust(false, dimension);
      String message = assertThrows(
              IllegalArgumentException.class, () -> formed(FilterPlan.of(gust, matching)))
          .getMessage();
      assertNames(message, "noise dimension must be 1 or more, got " + dimension, "Gust");
    }
  }

  /** Fills an array and keeps it, if it is of that kind, to spoil it later. */
  private static final class Kept {
    private final boolean keeps;
    private double[] array = new double[0];

    Kept(boolean keeps) {
      this.keeps = keeps;
    }

    void fill(double[] covariance, double variance) {
      int n = (int) Math.round(Math.sqrt(covariance.length));
      for (int i = 0; i < n; i++) {
        covariance[i * (n + 1)] = variance;
      }
      array = keeps ? covariance : array;
    }

    void spoil() {
      Arrays.fill(array, 1e3);
    }
  }

  private static final class Drift implements DifferentiableMotion {
    private final Kept noise;

    Drift(boolean keeps) {
      noise = new Kept(keeps);
    }

    @Override
    public Space stateSpace() {
      return Space.reals(2);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      noise.spoil();
      next[0] = state[0] + Math.sin(state[1]);
      next[1] = state[1];
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      noise.spoil();
      jacobian[0] = 1;
      jacobian[1] = Math.cos(state[1]);
      jacobian[3] = 1;
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      noise.fill(covariance, 0.3);
    }
  }

  private static final class Gust implements DifferentiableNoiseDrivenMotion {
    private final Kept kept;
    private final int noiseDimension;

    Gust(boolean keeps, int noiseDimension) {
      this.kept = new Kept(keeps);
      this.noiseDimension = noiseDimension;
    }

    @Override
    public Space stateSpace() {
      return Space.reals(2);
    }

    @Override
    public int noiseDimension() {
      return noiseDimension;
    }

    @Override
    public void move(
        double[] state, double[] noise, double[] control, double time, double dt, double[] next) {
      kept.spoil();
      next[0] = state[0] + noise[0] * Math.cos(state[1]);
      next[1] = state[1] + noise[1];
    }

    @Override
    public void moveJacobians(
        double[] state,
        double[] noise,
        double[] control,
        double time,
        double dt,
        double[] byState,
        double[] byNoise) {
      kept.spoil();
      byState[0] = 1;
      byState[1] = -noise[0] * Math.sin(state[1]);
      byState[3] = 1;
      byNoise[0] = Math.cos(state[1]);
      byNoise[3] = 1;
    }

    @Override
    public void noiseCovariance(double[] control, double time, double dt, double[] covariance) {
      kept.fill(covariance, 0.3);
    }
  }

  private static final class Sight implements DifferentiableSensor {
    private final Kept noise;

    Sight(boolean keeps) {
      noise = new Kept(keeps);
    }

    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      noise.spoil();
      measurement[0] = state[0];
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      noise.spoil();
      jacobian[0] = 1;
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      noise.fill(covariance, 0.5);
    }
  }
}

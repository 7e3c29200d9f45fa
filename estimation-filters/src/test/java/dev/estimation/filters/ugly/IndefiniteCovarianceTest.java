package dev.estimation.filters.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.PlainWalk;
import org.junit.jupiter.api.Test;

/**
 * A covariance that negative weights make indefinite: for z = x'x of x ~ N(0, I) in n dimensions, the
 * unscented rule with kappa = 3 - n, beta = 0 gives the variance 3 - n times n, below zero from n = 4
 * on (the true one is 2 n).
 */
class IndefiniteCovarianceTest extends BothForms {
  private static final int N = 5;
  private static final MomentMatching KURTOSIS =
      PointMatching.of(UnscentedRule.scaled(1, 0, n -> 3 - n));

  private static Gaussian standard() {
    return Gaussian.independent(new double[N], new double[] {1, 1, 1, 1, 1});
  }

  @Test
  void innovationCovariance() {
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(N, 1), KURTOSIS));
    SensorPort port = plan.workspace().port(new SquaredLength(0.5));
    Estimate estimate = plan.start(0, standard());
    long[] before = Bits.of(estimate, N);
    assertEquals(StepStatus.NOT_DEFINITE, port.update(estimate, new double[] {5}));
    assertArrayEquals(before, Bits.of(estimate, N));
    boolean root = form == Form.SQUARE_ROOT; // which has no value for what is no root
    String pivot = root ? "pivot 1 of 1 is NaN" : "pivot 1 of 1 is -9.";
    assertNames(port.failure(), "innovation", pivot, "SquaredLength");
    // With a measurement noise that outweighs the negative variance of -10, all is well.
    SensorPort coarse = plan.workspace().port(new SquaredLength(30));
    assertEquals(StepStatus.APPLIED, coarse.update(estimate, new double[] {5}));
  }

  @Test
  void predictedCovariance() {
    FilterPlan plan = formed(FilterPlan.of(new LengthIntoState(), KURTOSIS));
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, standard());
    long[] before = Bits.of(estimate, N);
    assertEquals(StepStatus.NOT_DEFINITE, work.predict(estimate, 1));
    assertArrayEquals(before, Bits.of(estimate, N));
    boolean root = form == Form.SQUARE_ROOT;
    String covariance = root ? "negative weights outweigh" : "predicted covariance";
    String pivot = root ? "not positive definite" : "pivot 1 of 5 is -9.";
    assertNames(work.failure(), covariance, pivot, "LengthIntoState");
    FilterPlan positive = formed(FilterPlan.cubature(new LengthIntoState()));
    assertEquals(StepStatus.APPLIED, positive.workspace().predict(estimate, 1));
  }

  private static double squaredLength(double[] x) {
    double sum = 0;
    for (double value : x) {
      sum += value * value;
    }
    return sum;
  }

  /** z = x'x. */
  private record SquaredLength(double variance) implements SensorModel {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = squaredLength(state);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = variance;
    }
  }

  /** The first component becomes x'x. */
  private record LengthIntoState() implements MotionModel {
    @Override
    public Space stateSpace() {
      return Space.reals(N);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      System.arraycopy(state, 0, next, 0, N);
      next[0] = squaredLength(state);
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      for (int i = 0; i < N; i++) {
        covariance[i * (N + 1)] = 0.1;
      }
    }
  }
}

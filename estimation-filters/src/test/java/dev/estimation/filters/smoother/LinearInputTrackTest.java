package dev.estimation.filters.smoother;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StackedPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.RangeAndBearing;
import dev.estimation.filters.sensor.Sight;
import dev.estimation.filters.testing.Turns;
import dev.estimation.testing.AllocationMeter;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Filter and smoother with linear inputs, against points over the whole state. */
class LinearInputTrackTest {
  private static final int STEPS = 12;
  private static final double[] PLACES = {-40, 10, 20, -50};
  private static final Gaussian PRIOR =
      Gaussian.independent(new double[] {100, 60, -8, 3, 0.15}, new double[] {5, 5, 2, 2, 0.05});
  private static final double[] ORIGIN = {0, 0};
  private static final RangeAndBearing RADAR =
      new RangeAndBearing(Sight.fromGiven(Components.of(0, 1)), 2, 0.02);
  private static final MomentMatching SIX = PointMatching.of(GaussHermiteRule.product(6));

  /** A track with range, bearing and two range rates, measured without errors, and its likelihood. */
  private static final class Run {
    final SmoothedTrack track;
    final Gaussian[] filtered = new Gaussian[STEPS];
    double logLikelihood;
    int predictions;
    int updates;

    Run(FilterPlan plan) {
      FilterWorkspace work = plan.workspace();
      SensorPort radar = work.port(RADAR);
      StackedPort rates = work.port(new Turns.RangeRate(), 2);
      Estimate estimate = plan.start(0, PRIOR);
      FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
      double[] truth = {104, 57, -9, 4, 0.2};
      double[] next = new double[5];
      double[] seen = new double[2];
      double[] grows = new double[2];
      for (int k = 0; k < STEPS; k++) {
        new Turns.Turn().move(truth, new double[0], k, 1, next);
        System.arraycopy(next, 0, truth, 0, 5);
        assertEquals(StepStatus.APPLIED, work.predict(estimate, k + 1.0), work::failure);
        predictions += work.evaluations();
        RADAR.measure(truth, ORIGIN, seen);
        assertEquals(StepStatus.APPLIED, radar.update(estimate, seen, ORIGIN), radar::failure);
        for (int i = 0; i < 2; i++) {
          double x = truth[0] - PLACES[2 * i];
          double y = truth[1] - PLACES[2 * i + 1];
          grows[i] = (x * truth[2] + y * truth[3]) / Math.hypot(x, y);
        }
        assertEquals(StepStatus.APPLIED, rates.update(estimate, 2, grows, PLACES));
        updates += rates.last().evaluations();
        logLikelihood += radar.logLikelihood() + rates.last().logLikelihood();
        filtered[k] = estimate.toGaussian();
        smoother.record(work, estimate);
      }
      track = smoother.smooth();
    }
  }

  /**
   * Six nodes leave (2 s)^12 6! / 12! = 1e-18 of a turn with a deviation of 0.05 rad, and with that of a direction of
   * 0.1 rad 4e-15; polynomials in the others are exact either way. 1e-9 standard deviations after 12 steps there and
   * back. The evaluations: 6 points of the rate, a centre and 4 a point for what is linear; 6^2 points of the
   * position, a centre and as many Jacobians.
   */
  @ParameterizedTest
  @ValueSource(booleans = {false, true})
  void aTurnAgrees(boolean squareRoot) {
    FilterPlan part = FilterPlan.of(new Turns.Turn(), SIX);
    FilterPlan all = FilterPlan.of(new Turns.Turn(), SIX.overWholeInput());
    Run linear = new Run(squareRoot ? part.inSquareRootForm() : part);
    Run whole = new Run(squareRoot ? all.inSquareRootForm() : all);
    assertWithin("log-likelihood", whole.logLikelihood, linear.logLikelihood, 1e-9, 1);
    for (int k = 0; k < STEPS; k++) {
      assertSame("filtered " + k, whole.filtered[k], linear.filtered[k]);
      assertSame("smoothed " + k, whole.track.gaussian(k), linear.track.gaussian(k));
    }
    assertEquals(STEPS * (1 + 6 + 6 * 4), linear.predictions);
    assertEquals(STEPS * (1 + 6 * 6), linear.updates);
    assertEquals(STEPS * (1 + 7776), whole.predictions);
  }

  private static void assertSame(String what, Gaussian wanted, Gaussian got) {
    for (int i = 0; i < wanted.dimension(); i++) {
      double own = Math.sqrt(wanted.covariance(i, i));
      assertWithin(what, wanted.mean(i), got.mean(i), 1e-9, own);
      for (int j = 0; j <= i; j++) {
        double scale = own * Math.sqrt(wanted.covariance(j, j));
        assertWithin(what, wanted.covariance(i, j), got.covariance(i, j), 1e-9, scale);
      }
    }
  }

  /**
   * Noise inside: place and slip are linear, heading and drift are not, and slip acts along a direction that drifts. Six
   * nodes at a deviation of 0.4 rad in all leave (4 s^2)^6 6! / 12! = 1e-7 of a variance at most: 1e-6.
   */
  @Test
  void noiseInsideAgrees() {
    Motion slip = new Turns.Slip();
    Gaussian prior = Gaussian.of(slip.stateSpace(), new double[] {1, 2, 3}, new double[][] {
      {1, 0.2, 0.1}, {0.2, 2, -0.1}, {0.1, -0.1, 0.06}
    });
    double[] control = {1.5};
    Estimate linear = FilterPlan.of(slip, SIX).start(0, prior);
    FilterWorkspace work = FilterPlan.of(slip, SIX).workspace();
    assertEquals(StepStatus.APPLIED, work.predict(linear, 0.5, control));
    assertEquals(1 + 36, work.evaluations());
    assertEquals(36, work.jacobians());
    FilterPlan all = FilterPlan.of(slip, SIX.overWholeInput());
    Estimate whole = all.start(0, prior);
    assertEquals(StepStatus.APPLIED, all.workspace().predict(whole, 0.5, control));
    for (int i = 0; i < 3; i++) {
      assertWithin("mean", whole.mean(i), linear.mean(i), 1e-6, 1);
      for (int j = 0; j <= i; j++) {
        assertWithin("covariance", whole.covariance(i, j), linear.covariance(i, j), 1e-6, 1);
      }
    }
  }

  /** 0 bytes a step. */
  @Test
  void aStepAllocatesNothing() {
    FilterPlan plan =
        FilterPlan.of(new Turns.Turn(), PointMatching.of(UnscentedRule.scaled(1e-3, 2, 0)));
    FilterWorkspace work = plan.workspace();
    StackedPort rates = work.port(new Turns.RangeRate(), 2);
    Estimate estimate = plan.start(0, PRIOR);
    double[] grows = {-5, 1};
    assertEquals(0, AllocationMeter.bytesPerCall(500, 500, () -> {
      if (work.predict(estimate, estimate.time() + 0.1) != StepStatus.APPLIED
          || rates.update(estimate, 2, grows, PLACES) != StepStatus.APPLIED) {
        throw new IllegalStateException(work.failure() + rates.last().failure());
      }
    }));
  }
}

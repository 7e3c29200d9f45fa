package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertSameBits;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.ToleranceMatching;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.filters.motion.ConstantVelocity;
import dev.estimation.filters.motion.CoordinatedTurn;
import dev.estimation.filters.motion.RandomWalk;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.Range;
import dev.estimation.filters.sensor.Sight;
import dev.estimation.filters.testing.BothForms;
import org.junit.jupiter.api.Test;

/** Filters whose moments are carried to a tolerance. */
class ToleranceFilterTest extends BothForms {
  private static final double[] STATION = {0, 0};

  private static Range range(double deviation) {
    return new Range(Sight.fromGiven(Components.of(0, 1)), deviation);
  }

  /** A range at its origin is not smooth: no number of points within the budget will do. */
  private static Estimate atTheOrigin(FilterPlan plan) {
    return plan.start(0, Gaussian.independent(new double[] {0.5, 0}, new double[] {10, 10}));
  }

  private FilterPlan walking(ToleranceMatching matching) {
    return formed(FilterPlan.of(new RandomWalk(1, 1), matching));
  }

  @Test
  void aStepBelowToleranceIsAppliedAndSaysSo() {
    FilterPlan plan = walking(ToleranceMatching.within(1e-3).withBudget(60));
    Estimate estimate = atTheOrigin(plan);
    SensorPort port = plan.workspace().port(range(0.1));
    StepStatus status = port.update(estimate, new double[] {3}, STATION);
    assertEquals(StepStatus.APPLIED_BELOW_TOLERANCE, status);
    assertTrue(status.isApplied());
    assertTrue(port.estimatedError() > 1e-3, "estimated error " + port.estimatedError());
    assertTrue(port.failure().contains("tolerance"), port.failure());
    assertTrue(estimate.mean(0) != 0.5, "the estimate has changed");
  }

  /** What is said is why the step was not applied, not that its moments were below the tolerance too. */
  @Test
  void aMeasurementThatOverflowsIsTold() {
    FilterPlan plan = walking(ToleranceMatching.within(1e-3).withBudget(60));
    SensorPort port = plan.workspace().port(range(0.1));
    StepStatus status = port.update(atTheOrigin(plan), new double[] {1e300}, STATION);
    assertEquals(StepStatus.RESULT_NOT_FINITE, status);
    assertTrue(port.failure().contains("overflows"), port.failure());
  }

  @Test
  void aPlanMayRefuseSuchSteps() {
    FilterPlan plan =
        walking(ToleranceMatching.within(1e-3).withBudget(60)).refusingBelowTolerance();
    Estimate estimate = atTheOrigin(plan);
    Gaussian before = estimate.toGaussian();
    SensorPort port = plan.workspace().port(range(0.1));
    StepStatus status = port.update(estimate, new double[] {3}, STATION);
    assertEquals(StepStatus.BELOW_TOLERANCE, status);
    assertFalse(status.isApplied());
    assertSameBits("mean", before.mean(), estimate.toGaussian().mean());
    assertSameBits("covariance", before.covariance(), estimate.toGaussian().covariance());
    assertTrue(port.failure().contains("Range"), port.failure());
  }

  @Test
  void predictionsHaveTheSameChoice() {
    FilterPlan turning = formed(FilterPlan.of(
        new CoordinatedTurn(0.1, 1e-4), ToleranceMatching.within(1e-9).withBudget(20)));
    Gaussian start =
        Gaussian.independent(new double[] {0, 0, 150, 0, 0.05}, new double[] {10, 10, 5, 5, 0.2});
    FilterWorkspace work = turning.workspace();
    assertEquals(StepStatus.APPLIED_BELOW_TOLERANCE, work.predict(turning.start(0, start), 20));
    assertTrue(work.failure().contains("tolerance"), work.failure());
    FilterPlan refusing = turning.refusingBelowTolerance();
    Estimate estimate = refusing.start(0, start);
    FilterWorkspace careful = refusing.workspace();
    assertEquals(StepStatus.BELOW_TOLERANCE, careful.predict(estimate, 20));
    assertEquals(0, estimate.time(), 0);
  }

  /**
   * A scalar range whose prior is 1e5 times its noise: 100 km across, 3000 km away, noise 1 m. The posterior is that
   * of a converged product of 25 nodes: the normalised error squared of a truth 40 km aside is within 10 %.
   */
  @Test
  void aRangeMuchSharperThanThePrior() {
    double[] truth = {3.03e6, 4e4};
    double[] seen = {Math.hypot(truth[0], truth[1])};
    Gaussian prior = Gaussian.independent(new double[] {3e6, 0}, new double[] {1e5, 1e5});
    double converged = nees(
        formed(FilterPlan.of(new RandomWalk(1, 1), PointMatching.of(GaussHermiteRule.product(25)))),
        prior,
        seen,
        truth);
    double tolerance = nees(walking(ToleranceMatching.within(0.01)), prior, seen, truth);
    assertEquals(converged, tolerance, 0.1 * converged);
    double linear = nees(formed(FilterPlan.extended(new RandomWalk(1, 1))), prior, seen, truth);
    assertTrue(linear > 1000, "linearisation has a NEES of " + linear);
  }

  private static double nees(FilterPlan plan, Gaussian prior, double[] seen, double[] truth) {
    Estimate estimate = plan.start(0, prior);
    SensorPort port = plan.workspace().port(range(1));
    assertEquals(StepStatus.APPLIED, port.update(estimate, seen, STATION));
    Gaussian posterior = estimate.toGaussian();
    double x = truth[0] - posterior.mean()[0];
    double y = truth[1] - posterior.mean()[1];
    double xx = posterior.covariance().get(0, 0);
    double xy = posterior.covariance().get(0, 1);
    double yy = posterior.covariance().get(1, 1);
    return (yy * x * x - 2 * xy * x * y + xx * y * y) / (xx * yy - xy * xy);
  }

  /** A straight motion and a range seen from afar take no more than the first points. */
  @Test
  void whatIsNearlyLinearIsCheap() {
    FilterPlan plan = formed(FilterPlan.withinTolerance(new ConstantVelocity(0.1, 0.1), 0.01));
    Estimate estimate = plan.start(
        0, Gaussian.independent(new double[] {5000, 0, 3, 4}, new double[] {5, 5, 1, 1}));
    FilterWorkspace work = plan.workspace();
    assertEquals(StepStatus.APPLIED, work.predict(estimate, 1));
    assertEquals(1, work.evaluations());
    assertEquals(0, work.estimatedError(), 0);
    SensorPort port = work.port(range(10));
    assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {5003}, STATION));
    assertEquals(7, port.evaluations());
  }
}

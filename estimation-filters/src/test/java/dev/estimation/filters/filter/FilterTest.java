package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.ChainMotion;
import dev.estimation.filters.testing.ChainSight;
import dev.estimation.filters.testing.FaultySensor;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.filters.testing.PlainWalk;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** What holds for the filter on every matching. */
class FilterTest extends BothForms {
  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  private static Gaussian standard(double... mean) {
    double[] ones = new double[mean.length];
    java.util.Arrays.fill(ones, 1);
    return Gaussian.independent(mean, ones);
  }

  /** Updating with two independent rows at once or one after another is the same. */
  @ParameterizedTest
  @MethodSource("matchings")
  void independentRowsMayComeOneAfterAnother(MomentMatching matching) {
    Gaussian prior = Gaussian.of(new double[] {1, 2}, new double[][] {{2, 0.7}, {0.7, 3}});
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(2, 1), matching));
    Estimate together = plan.start(0, prior);
    SensorPort both = plan.workspace().port(new FaultySensor());
    assertEquals(StepStatus.APPLIED, both.update(together, new double[] {1.4, 1.1}));

    Estimate apart = plan.start(0, prior);
    SensorPort first = plan.workspace().port(new Component(0));
    SensorPort second = plan.workspace().port(new Component(1));
    assertEquals(StepStatus.APPLIED, first.update(apart, new double[] {1.4}));
    double sum = first.logLikelihood();
    assertEquals(StepStatus.APPLIED, second.update(apart, new double[] {1.1}));
    sum += second.logLikelihood();

    for (int i = 0; i < 2; i++) {
      // 1e-14: a few roundings on numbers of order 1.
      assertWithin("mean", together.mean(i), apart.mean(i), 1e-14, 3);
      for (int j = 0; j < 2; j++) {
        assertWithin("covariance", together.covariance(i, j), apart.covariance(i, j), 1e-14, 3);
      }
    }
    assertWithin("log-likelihood", both.logLikelihood(), sum, 1e-14, 5);
  }

  /** Heading and its sensor on both sides of the seam: the innovation is the short way round. */
  @ParameterizedTest
  @MethodSource("matchings")
  void anglesCrossTheirSeam(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new Heading(0.2), matching));
    FilterWorkspace work = plan.workspace();
    SensorPort compass = work.port(new Models.Compass());
    Estimate heading = plan.start(0, Gaussian.independent(new double[] {3.1}, new double[] {0.1}));
    assertEquals(StepStatus.APPLIED, work.predict(heading, 1));
    // 3.1 + 0.2 = 3.3, past pi: 3.3 - 2 pi.
    assertWithin("predicted", 3.3 - 2 * Math.PI, heading.mean(0), 1e-14, 1);
    assertEquals(StepStatus.APPLIED, compass.update(heading, new double[] {3.1}));
    // Equal variances of 0.01 (Q is 0): half way between 3.3 and 3.1, back across the seam.
    assertWithin("innovation", -0.2, compass.innovation()[0], 1e-14, 1);
    assertWithin("updated", 3.2 - 2 * Math.PI, heading.mean(0), 1e-14, 1);
    assertWithin("variance", 0.005, heading.covariance(0, 0), 1e-14, 1);
  }

  @Test
  void initialAnglesAreBroughtIntoRange() {
    FilterPlan plan = formed(FilterPlan.extended(new Heading(0)));
    Estimate heading = plan.start(0, Gaussian.independent(new double[] {4}, new double[] {1}));
    assertEquals(4 - 2 * Math.PI, heading.mean(0));
  }

  @Test
  void gateIsTheChiSquareQuantile() {
    FilterPlan plan = formed(FilterPlan.extended(new PlainWalk(1, 1))).withGate(0.95);
    SensorPort port = plan.workspace().port(new PlainPosition(1, 1));
    // S = 2; the 0.95 quantile with 1 degree of freedom is 3.84145882069413 (NIST tables).
    double limit = Math.sqrt(2 * 3.84145882069413);
    Estimate inside = plan.start(0, standard(0));
    assertEquals(StepStatus.APPLIED, port.update(inside, new double[] {limit - 1e-9}));
    Estimate outside = plan.start(0, standard(0));
    assertEquals(StepStatus.GATED, port.update(outside, new double[] {limit + 1e-9}));
    assertWithin("NIS", 3.84145882069413, port.normalisedInnovationSquared(), 1e-8, 1);
    assertEquals(0, outside.mean(0));
  }

  static List<Arguments> namedMatchings() {
    return Matchings.all().stream()
        .map(named -> Arguments.of(Named.of(named.getName(), named)))
        .toList();
  }

  @ParameterizedTest
  @MethodSource("namedMatchings")
  void evaluationsAreCounted(Named<MomentMatching> named) {
    FilterPlan plan = formed(FilterPlan.of(new ChainMotion(3), named.getPayload()));
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(new ChainSight(3));
    Estimate estimate = plan.start(0, standard(0, 0, 0));
    assertEquals(StepStatus.APPLIED, work.predict(estimate, 0.1));
    assertEquals(StepStatus.APPLIED, port.update(estimate, new double[2]));
    // The motion reads all of three components, the sensor two of them.
    assertEquals(Matchings.evaluations(named, 3, 3), work.evaluations());
    assertEquals(Matchings.jacobians(named, 3, 3), work.jacobians());
    assertEquals(Matchings.jacobians(named, 2, 3), port.jacobians());
    assertEquals(Matchings.evaluations(named, 2, 3), port.evaluations());
  }

  /** One plan serves many threads: each gets the bits that one thread alone gets. */
  @Test
  void aPlanIsSharedByThreads() throws Exception {
    FilterPlan plan = formed(FilterPlan.unscented(new ChainMotion(4), 1, 2, 0));
    Callable<long[]> run = () -> follow(plan);
    long[] alone = run.call();
    ExecutorService threads = Executors.newFixedThreadPool(4);
    try {
      List<Future<long[]>> results = new ArrayList<>();
      for (int i = 0; i < 8; i++) {
        results.add(threads.submit(run));
      }
      for (Future<long[]> result : results) {
        assertArrayEquals(alone, result.get());
      }
    } finally {
      threads.shutdown();
    }
  }

  private static long[] follow(FilterPlan plan) {
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(new ChainSight(4));
    Estimate estimate = plan.start(0, standard(0.1, 0.2, 0.3, 0.4));
    for (int k = 1; k <= 200; k++) {
      assertEquals(StepStatus.APPLIED, work.predict(estimate, 0.1 * k));
      double[] measurement = {0.1 * Math.sin(k), 0.1 * Math.cos(k)};
      assertEquals(StepStatus.APPLIED, port.update(estimate, measurement));
    }
    return Bits.of(estimate, 4);
  }

  @Test
  void anEstimateIsNotTheGaussianItStartedFrom() {
    FilterPlan plan = formed(FilterPlan.extended(new PlainWalk(1, 1)));
    Gaussian start = standard(5);
    Estimate estimate = plan.start(0, start);
    assertEquals(StepStatus.APPLIED, plan.workspace().predict(estimate, 1));
    assertEquals(1, start.covariance(0, 0));
    assertWithin("variance", 2, estimate.covariance(0, 0), 1e-15, 2); // a root, squared again
    assertFalse(estimate.toGaussian().equals(start));
  }

  /** One component of two, variance 1. */
  private record Component(int index) implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = state[index];
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[index] = 1;
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 1;
    }
  }

  /** An angle that turns at a known rate. */
  private record Heading(double rate) implements DifferentiableMotion {
    @Override
    public Space stateSpace() {
      return Space.angles(1);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      next[0] = state[0] + rate * dt;
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      jacobian[0] = 1;
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {}
  }
}

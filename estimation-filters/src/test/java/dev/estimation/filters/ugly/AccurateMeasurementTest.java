package dev.estimation.filters.ugly;

import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.RandomGaussians;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Measurements far more accurate than the prior: an ordinary start, never a reason to refuse. */
class AccurateMeasurementTest extends BothForms {
  private static final int DRAWS = 200;

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  /** x1 = factor x0 exactly, x0 known to 1..2 km. */
  private static Gaussian cloned(RandomGaussians random) {
    double factor = random.vector(1)[0];
    double variance = Math.pow(random.uniform(1000, 2000), 2);
    double mean = 1000 * random.vector(1)[0];
    double shared = factor * variance;
    return Gaussian.of(new double[] {mean, factor * mean}, new double[][] {
      {variance, shared}, {shared, factor * shared}
    });
  }

  private static SensorPort undeclared(FilterPlan plan) {
    DMatrixRMaj h = new DMatrixRMaj(new double[][] {{1, 0}});
    DMatrixRMaj r = new DMatrixRMaj(new double[][] {{1}});
    return plan.workspace().port(new Models.LinearSensor(h, r));
  }

  /** A metre against kilometres: whatever inputs are declared, the same estimate. */
  @ParameterizedTest
  @MethodSource("matchings")
  void clonedStates(MomentMatching matching) {
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(2, 1), matching));
    SensorPort port = plan.workspace().port(new PlainPosition(2, 1));
    SensorPort whole = undeclared(plan);
    for (int seed = 0; seed < DRAWS; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      Gaussian prior = cloned(random);
      double[] z = {prior.mean(0) + prior.standardDeviation(0) * random.vector(1)[0]};
      Estimate one = plan.start(0, prior);
      Estimate other = plan.start(0, prior);
      assertEquals(StepStatus.APPLIED, port.update(one, z), port::failure);
      assertEquals(StepStatus.APPLIED, whole.update(other, z), whole::failure);
      assertAgree("draw " + seed, other, one);
    }
  }

  /**
   * 1e-6 standard deviations of about 1 m: the last pivot of a factor is the rounding of 1e6 m^2,
   * some 1e-10 m^2; kilometres are rounded to 1e-12 m.
   */
  private static void assertAgree(String draw, Estimate wanted, Estimate got) {
    for (int i = 0; i < 2; i++) {
      double deviation = wanted.standardDeviation(i);
      assertWithin(draw + ", mean", wanted.mean(i), got.mean(i), 1e-6, deviation);
      for (int j = 0; j <= i; j++) {
        double scale = deviation * wanted.standardDeviation(j);
        double covariance = wanted.covariance(i, j);
        assertWithin(draw + ", covariance", covariance, got.covariance(i, j), 1e-6, scale);
      }
    }
  }

  /**
   * P R / (P + R), with 18 decades between P and R. 1e-6 is what is asked; nothing is subtracted,
   * so a few roundings are expected.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void scalar(MomentMatching matching) {
    double noise = 1e-8;
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(1, 1), matching));
    SensorPort port = plan.workspace().port(new PlainPosition(1, noise));
    for (int seed = 0; seed < DRAWS; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      double variance = 1e10 * random.uniform(0.5, 2);
      double mean = 1e3 * random.vector(1)[0];
      Estimate estimate =
          plan.start(0, Gaussian.of(new double[] {mean}, new double[][] {{variance}}));
      double z = mean + Math.sqrt(variance) * random.vector(1)[0];
      assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {z}), port::failure);
      double wanted = variance / (variance + noise) * noise;
      assertRelative("draw " + seed, wanted, estimate.covariance(0, 0), 1e-6);
      // 1e-9 m: 1e-5 deviations of 1e-4 m, and some fifty roundings of 1e5 m.
      assertWithin("draw " + seed, z, estimate.mean(0), 1e-9, 1);
    }
  }
}

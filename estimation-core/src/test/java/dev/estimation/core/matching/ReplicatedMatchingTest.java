package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.LatinHypercubeRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.QuasiRandomRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AllocationMeter;
import dev.estimation.testing.RandomGaussians;
import java.util.function.LongFunction;
import org.apache.commons.math3.stat.descriptive.moment.Variance;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Moments from replicates: the formulas, their bias, and when there is no standard error. */
class ReplicatedMatchingTest {
  private static final double[] NOTHING = {};

  private static final VectorFunction BENT = (u, given, z) -> {
    z[0] = Math.exp(0.5 * u[0]) + u[1];
    z[1] = Math.sin(u[0] - u[1]);
  };

  private static Moments unitNormal(int n) {
    double[] deviations = new double[n];
    java.util.Arrays.fill(deviations, 1);
    return RandomGaussians.momentsOf(Gaussian.independent(new double[n], deviations));
  }

  private static MatchingWorkspace workspace(PointRule rule) {
    return PointMatching.of(rule).workspace(Space.reals(2), Space.reals(2), BENT);
  }

  private static SampledWorkspace sampled(PointRule rule) {
    return assertInstanceOf(SampledWorkspace.class, workspace(rule));
  }

  /** The images of the points, by component. */
  private static double[][] images(UnitPoints points) {
    double[][] images = new double[2][points.size()];
    double[] image = new double[2];
    for (int i = 0; i < points.size(); i++) {
      double[] place = {points.coordinate(i, 0), points.coordinate(i, 1)};
      BENT.evaluate(place, NOTHING, image);
      images[0][i] = image[0];
      images[1][i] = image[1];
    }
    return images;
  }

  /** The means of products of errors over each replicate; of errors alone if other is null. */
  private static double[] replicateMeans(double[] values, double[] other, int replicates) {
    double[] means = new double[replicates];
    int size = values.length / replicates;
    for (int i = 0; i < values.length; i++) {
      double error = values[i] - mean(values);
      means[i / size] += (other == null ? error : error * (other[i] - mean(other))) / size;
    }
    return means;
  }

  private static double mean(double[] values) {
    return java.util.Arrays.stream(values).average().orElseThrow();
  }

  private static double standardError(double[] values) {
    return Math.sqrt(new Variance().evaluate(values) / values.length);
  }

  /** By the definition, with commons-math3's variance; 1e-12: rounding of sums of 160 numbers. */
  @Test
  void momentsAndStandardErrorsFollowTheirDefinition() {
    PointRule[] rules = {
      RandomRule.independent(160, 2),
      RandomRule.antithetic(80, 2),
      LatinHypercubeRule.of(8, 2).replicates(20),
      QuasiRandomRule.sobol(10).shifted(16, 2),
    };
    DMatrixRMaj noise = new DMatrixRMaj(new double[][] {{0.5, 0.1}, {0.1, 0.25}});
    for (PointRule rule : rules) {
      SampledWorkspace work = sampled(rule);
      Outcome got = Outcome.of(work, unitNormal(2), NOTHING, noise);
      double[][] images = images(rule.points(2));
      int replicates = rule.points(2).replicates();
      assertEquals(replicates, work.replicates());
      for (int r = 0; r < 2; r++) {
        double[] offsets = replicateMeans(images[r], null, replicates);
        assertRelative("mean", mean(images[r]), got.mean[r], 1e-12);
        assertRelative("error", standardError(offsets), work.meanStandardError(r), 1e-12);
        for (int c = 0; c < 2; c++) {
          double[] products = replicateMeans(images[r], images[c], replicates);
          double[] others = replicateMeans(images[c], null, replicates);
          double wanted = mean(products) + scatter(offsets, others) + noise.get(r, c);
          assertWithin("covariance", wanted, got.covariance.get(r, c), 1e-12, 1);
          double error = work.covarianceStandardError(r, c);
          assertRelative("its error", standardError(products), error, 1e-12);
        }
      }
    }
  }

  /** sum a_r b_r / (R (R - 1)). */
  private static double scatter(double[] a, double[] b) {
    double sum = 0;
    for (int r = 0; r < a.length; r++) {
      sum += a[r] * b[r];
    }
    return sum / (a.length * (a.length - 1.0));
  }

  /** Single draws: the sample covariance, and sqrt(p_rr / N). 1e-12: sums of 50 numbers. */
  @Test
  void singleDrawsHaveTheTextbookErrors() {
    SampledWorkspace work = sampled(RandomRule.independent(50, 4));
    Outcome got = Outcome.of(work, unitNormal(2), NOTHING, null);
    double[][] images = images(RandomRule.independent(50, 4).points(2));
    double variance = new Variance().evaluate(images[1]);
    assertRelative("variance", variance, got.covariance.get(1, 1), 1e-12);
    assertRelative("error", Math.sqrt(variance / 50), work.meanStandardError(1), 1e-12);
  }

  /**
   * 16 replicates of 2 points: the variance of x itself is 1, and so is W. Without the scatter of the mean
   * both would fall short by its variance, 0.011 for hypercubes (0.36 is the variance in half a normal
   * distribution) and more for shifts. A run's variance scatters by sqrt(2 / 31) at most some 0.3; over
   * 20 000 seeds 5 deviations are 0.0106.
   */
  @Test
  void smallReplicatesAreUnbiased() {
    assertUnbiased(seed -> LatinHypercubeRule.of(2, seed).replicates(16));
    assertUnbiased(seed -> QuasiRandomRule.halton(2).shifted(16, seed));
  }

  private static void assertUnbiased(LongFunction<PointRule> rules) {
    int seeds = 20_000;
    double variance = 0;
    double cross = 0;
    for (int seed = 0; seed < seeds; seed++) {
      MatchingWorkspace work = PointMatching.of(rules.apply(seed))
          .workspace(Space.reals(1), Space.reals(1), (u, given, z) -> z[0] = u[0]);
      Outcome got = Outcome.of(work, unitNormal(1), NOTHING, null);
      variance += got.covariance.get(0, 0) / seeds;
      cross += got.unitCross.get(0, 0) / seeds;
    }
    assertWithin("variance", 1, variance, 5, 0.3 / Math.sqrt(seeds));
    assertWithin("cross", 1, cross, 5, 0.3 / Math.sqrt(seeds));
  }

  /** W is about both means: of x itself it is the covariance of x. 1e-13: rounding. */
  @Test
  void oneHypercubeIsTakenAboutItsMeans() {
    MatchingWorkspace work = PointMatching.of(LatinHypercubeRule.of(5, 3))
        .workspace(Space.reals(1), Space.reals(1), (u, given, z) -> z[0] = u[0] + 7);
    Outcome got = Outcome.of(work, unitNormal(1), NOTHING, null);
    assertWithin("cross", got.covariance.get(0, 0), got.unitCross.get(0, 0), 1e-13, 1);
    assertTrue(Math.abs(got.mean[0] - 7) > 1e-4, "the sample has a mean of its own");
  }

  @Test
  void pointsWithoutReplicatesHaveNoStandardErrors() {
    PointRule[] rules = {
      LatinHypercubeRule.of(100, 1),
      QuasiRandomRule.sobol(100),
      QuasiRandomRule.halton(100),
      QuasiRandomRule.sobol(100).shifted(1, 1),
      QuasiRandomRule.sobol(7).shifted(16, 1).standardised(),
      LatinHypercubeRule.of(7, 1).replicates(16).standardised(),
      RandomRule.antithetic(50, 1).standardised(),
    };
    for (PointRule rule : rules) {
      assertTrue(!(workspace(rule) instanceof SampledWorkspace));
      assertTrue(rule.points(2).replicates() < 2);
    }
  }

  /** Odd functions cancel in each pair: nothing is left but rounding, and the error says so. */
  @Test
  void antitheticPairsAreExactForOddFunctions() {
    SampledWorkspace work = sampled(RandomRule.antithetic(100, 6));
    Outcome got = Outcome.of(work, unitNormal(2), NOTHING, null);
    assertWithin("mean", 0, got.mean[1], 1e-15, 1);
    assertWithin("error", 0, work.meanStandardError(1), 1e-15, 1);
  }

  /**
   * Sums over single axes gain by strata: within one of 128 the scatter is small. Asked is a fifth of the
   * standard error of as many independent draws; a standard error of 16 replicates is known to 18 %.
   */
  @Test
  void strataHelpWhereAxesWorkAlone() {
    SampledWorkspace strata = sampled(LatinHypercubeRule.of(128, 1).replicates(16));
    SampledWorkspace draws = sampled(RandomRule.independent(128 * 16, 1));
    Outcome.of(strata, unitNormal(2), NOTHING, null);
    Outcome.of(draws, unitNormal(2), NOTHING, null);
    assertTrue(strata.meanStandardError(0) < 0.2 * draws.meanStandardError(0));
  }

  @Test
  void callsAllocateNothing() {
    SampledWorkspace work = sampled(QuasiRandomRule.sobol(15).shifted(16, 2));
    Moments input = unitNormal(2);
    assertEquals(0, AllocationMeter.bytesPerCall(200, 200, () -> {
      work.carry(input, NOTHING, null);
      work.unexplained();
      work.meanStandardError(0);
      work.covarianceStandardError(0, 1);
    }));
  }
}

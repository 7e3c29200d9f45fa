package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AllocationMeter;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Moments by random draws, and what is said of their errors. */
class SampledMatchingTest {
  private static final double[] NOTHING = {};

  /** Sine and cosine of a standard normal number; closed forms in check values of section 2. */
  private static final VectorFunction CIRCLE = (u, given, z) -> {
    z[0] = Math.sin(u[0]);
    z[1] = Math.cos(u[0]);
  };

  private static Moments standardNormal() {
    return RandomGaussians.momentsOf(Gaussian.independent(new double[] {0}, new double[] {1}));
  }

  /**
   * 1000 seeds of 400 draws: an honest standard error holds the truth within +-2 in 95.4 % of them,
   * +-0.66 % by chance; 4 deviations of that, 6e-5 false alarms for each of the 5 checks. The
   * covariance's error is itself estimated, which costs it a little: 93.5 to 97 % are asked there.
   */
  @Test
  void standardErrorsHoldTheTruthAsOftenAsTheySay() {
    double cosMean = Math.exp(-0.5);
    double sinVariance = (1 - Math.exp(-2)) / 2;
    double cosVariance = (1 + Math.exp(-2)) / 2 - Math.exp(-1);
    int[] held = new int[5];
    for (int seed = 0; seed < 1000; seed++) {
      SampledWorkspace work = workspace(RandomRule.independent(400, seed));
      assertEquals(MatchingStatus.MATCHED, work.carry(standardNormal(), NOTHING, null));
      double[] mean = work.output().mean();
      DMatrixRMaj p = work.output().covariance();
      held[0] += holds(mean[0], work.meanStandardError(0));
      held[1] += holds(mean[1] - cosMean, work.meanStandardError(1));
      held[2] += holds(p.get(0, 0) - sinVariance, work.covarianceStandardError(0, 0));
      held[3] += holds(p.get(1, 1) - cosVariance, work.covarianceStandardError(1, 1));
      held[4] += holds(p.get(0, 1), work.covarianceStandardError(0, 1));
    }
    assertWithin("mean of sine", 0.954, held[0] / 1000.0, 4, 0.0066);
    assertWithin("mean of cosine", 0.954, held[1] / 1000.0, 4, 0.0066);
    for (int i = 2; i < 5; i++) {
      assertWithin("covariance " + i, 0.9525, held[i] / 1000.0, 1, 0.0175);
    }
  }

  private static int holds(double error, double standardError) {
    return Math.abs(error) <= 2 * standardError ? 1 : 0;
  }

  private static SampledWorkspace workspace(RandomRule rule) {
    return assertInstanceOf(
        SampledWorkspace.class,
        PointMatching.of(rule).workspace(Space.reals(1), Space.reals(2), CIRCLE));
  }

  /** The average over many seeds is free of bias: division by N - 1, about the sample mean. */
  @Test
  void smallSamplesAreUnbiased() {
    double sinVariance = (1 - Math.exp(-2)) / 2;
    double sum = 0;
    double cross = 0;
    int seeds = 20_000;
    for (int seed = 0; seed < seeds; seed++) {
      SampledWorkspace work = workspace(RandomRule.independent(4, seed));
      work.carry(standardNormal(), NOTHING, null);
      sum += work.output().covariance().get(0, 0);
      cross += work.unitCrossCovariance().get(0, 0);
    }
    // A sample variance of 4 draws scatters by about its own size: 0.5 / sqrt(20000), 5 deviations.
    assertWithin("variance", sinVariance, sum / seeds, 5, 0.5 / Math.sqrt(seeds));
    // E x sin x = e^(-1/2); it scatters less than 1 in 4 draws.
    assertWithin("cross", Math.exp(-0.5), cross / seeds, 5, 1 / Math.sqrt(seeds));
  }

  /** 1e-12: rounding of sums over 1000 draws. */
  @Test
  void standardisedDrawsAreExactForAffineMaps() {
    RandomGaussians random = new RandomGaussians(9);
    AffineProblem problem = new AffineProblem(
        random.matrix(2, 4), random.vector(2), random.moments(4), random.covariance(2));
    MatchingWorkspace work = PointMatching.of(RandomRule.independent(1000, 1).standardised())
        .workspace(Space.reals(4), Space.reals(2), problem.function());
    assertFalse(work instanceof SampledWorkspace);
    assertEquals(
        MatchingStatus.MATCHED,
        work.carry(problem.input, NOTHING, RandomGaussians.noise(problem.noise)));
    assertVector("mean", problem.mean(), work.output().mean(), 1e-12, 10);
    assertCovariance("covariance", problem.covariance(), work.output().covariance(), 1e-12);
  }

  @Test
  void callsAllocateNothing() {
    SampledWorkspace work = workspace(RandomRule.independent(200, 2));
    Moments input = standardNormal();
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> work.carry(input, NOTHING, null)));
  }
}

package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.points.LatinHypercubeRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.QuasiRandomRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.ReferenceTable;
import java.util.function.LongFunction;
import java.util.stream.Stream;
import org.apache.commons.math3.distribution.TDistribution;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * How often +-2 standard errors hold the exact value, over 1000 seeds, 0 to 999, for each rule.
 *
 * <p>If replicates were normal, that would be Student's share with R - 1 degrees of freedom, 93.6 % for R =
 * 16 and 95.0 % for R = 64, +-0.8 % by chance. They are not: a few points in the tails decide, more so in
 * covariances, and then errors and standard errors are small together. The share must lie within 4 deviations
 * of Student's, less an allowance below it for this: 1 % for means and 3 % for covariances, at R =
 * 16 twice that. Chance alone gives a false alarm of 6e-5 for each of the 60 checks.
 */
class ReplicateCoverageTest {
  private static final int RUNS = 1000;
  private static final double[] NOTHING = {};
  private static final int[][] ENTRIES = {{0, 0}, {1, 0}, {1, 1}};

  static Stream<Arguments> rules() {
    return Stream.of(
        rule("antithetic", 500, s -> RandomRule.antithetic(500, s)),
        rule("Latin hypercube", 64, s -> LatinHypercubeRule.of(32, s).replicates(64)),
        rule("Sobol", 64, s -> QuasiRandomRule.sobol(63).shifted(64, s)),
        rule("Halton", 64, s -> QuasiRandomRule.halton(63).shifted(64, s)),
        rule("Latin hypercube, few", 16, s -> LatinHypercubeRule.of(32, s).replicates(16)),
        rule("Halton, few", 16, s -> QuasiRandomRule.halton(63).shifted(16, s)));
  }

  private static Arguments rule(String name, int replicates, LongFunction<PointRule> rule) {
    return Arguments.of(name, replicates, rule);
  }

  /** Closed form: polar2d_exact.csv. */
  @ParameterizedTest(name = "{0}")
  @MethodSource("rules")
  void rangeAndBearing(String name, int replicates, LongFunction<PointRule> rules) {
    PolarCase polar = PolarCase.named("range_one_bearing_90");
    ReferenceTable.Row exact = polar.exact();
    double[] mean = {exact.number("mean_x"), exact.number("mean_y")};
    double[] covariance = {
      exact.number("cov_xx"), exact.number("cov_xy"), exact.number("cov_yy"),
    };
    int[] held = count(rules, polar.polar(), new PolarToCartesian(), mean, covariance);
    assertShares(name, replicates, held);
  }

  /**
   * exp(x) and x y for independent x ~ N(1/2, v), y ~ N(1, w): means e = exp(1/2 + v/2) and 1/2,
   * variances e^2 (exp(v) - 1) and v + w / 4 + v w, covariance v e.
   */
  @ParameterizedTest(name = "{0}")
  @MethodSource("rules")
  void exponentialAndProduct(String name, int replicates, LongFunction<PointRule> rules) {
    Gaussian input = Gaussian.independent(new double[] {0.5, 1}, new double[] {0.4, 0.3});
    VectorFunction function = (u, given, z) -> {
      z[0] = Math.exp(u[0]);
      z[1] = u[0] * u[1];
    };
    double v = 0.16;
    double w = 0.09;
    double e = Math.exp(0.5 + v / 2);
    double[] mean = {e, 0.5};
    double[] covariance = {e * e * Math.expm1(v), v * e, v + w / 4 + v * w};
    assertShares(name, replicates, count(rules, input, function, mean, covariance));
  }

  /** In how many runs each of the two means and three covariances is held. */
  private static int[] count(
      LongFunction<PointRule> rules,
      Gaussian input,
      VectorFunction function,
      double[] mean,
      double[] covariance) {
    int[] held = new int[5];
    for (int seed = 0; seed < RUNS; seed++) {
      SampledWorkspace work = assertInstanceOf(
          SampledWorkspace.class,
          PointMatching.of(rules.apply(seed)).workspace(Space.reals(2), Space.reals(2), function));
      Outcome got = Outcome.of(work, RandomGaussians.momentsOf(input), NOTHING, null);
      for (int i = 0; i < 2; i++) {
        held[i] += holds(got.mean[i] - mean[i], work.meanStandardError(i));
      }
      for (int i = 0; i < 3; i++) {
        int row = ENTRIES[i][0];
        int column = ENTRIES[i][1];
        double error = got.covariance.get(row, column) - covariance[i];
        held[2 + i] += holds(error, work.covarianceStandardError(row, column));
      }
    }
    return held;
  }

  private static int holds(double error, double standardError) {
    return Math.abs(error) <= 2 * standardError ? 1 : 0;
  }

  private static void assertShares(String name, int replicates, int[] held) {
    double student = 1 - 2 * new TDistribution(null, replicates - 1).cumulativeProbability(-2);
    double chance = 4 * Math.sqrt(student * (1 - student) / RUNS);
    assertEquals(5, held.length);
    for (int i = 0; i < held.length; i++) {
      double allowance = (i < 2 ? 0.01 : 0.03) * (replicates == 16 ? 2 : 1);
      double share = held[i] / (double) RUNS;
      String what = name + ", result " + i + ": " + share + " of " + student;
      assertTrue(share >= student - chance - allowance, what);
      assertTrue(share <= student + chance, what);
    }
  }
}

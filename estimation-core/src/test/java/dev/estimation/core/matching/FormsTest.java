package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.LatinHypercubeRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.QuasiRandomRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.BentFunction;
import dev.estimation.testing.EmbeddedFunction;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Both forms of every matching give the same moments on well-conditioned input. */
class FormsTest {
  private static final int WHOLE = 5;
  private static final int OUTPUTS = 3;

  /** Matchings, and by how much their weights amplify rounding. */
  static Stream<Arguments> matchings() {
    Stream<Arguments> named = Stream.of(
            "linearisation",
            "linearisation 2",
            "spread 1",
            "spread 2",
            "spread axes",
            "unscented 1 2 0",
            "unscented 0.5 2 1",
            "cubature 3",
            "cubature 5",
            "McNamee-Stenger",
            "simplex",
            "simplex 1/3",
            "Gauss-Hermite 2",
            "Gauss-Hermite 3")
        .map(name -> Arguments.of(Named.of(name, NamedMatchings.of(name)), 1.0));
    Stream<Arguments> drawn = Stream.of(
            rule("narrow", UnscentedRule.scaled(1e-3, 2, 0)),
            rule("kappa = 3.5 - n", UnscentedRule.scaled(1, 2, n -> 3.5 - n)),
            rule("at 2 deviations", UnscentedRule.atDeviations(2)),
            rule("sparse, level 3", SparseGridRule.ofLevel(3)),
            rule("random", RandomRule.independent(60, 7).standardised()),
            rule("antithetic", RandomRule.antithetic(40, 7).standardised()),
            rule("Latin", LatinHypercubeRule.of(60, 7).standardised()),
            rule("Sobol", QuasiRandomRule.sobol(63).standardised()))
        .map(rule -> Arguments.of(
            Named.of(rule.getName(), PointMatching.of(rule.getPayload())),
            rule.getPayload().points(WHOLE).weightAmplification()));
    return Stream.concat(named, drawn);
  }

  private static Named<PointRule> rule(String name, PointRule rule) {
    return Named.of(name, rule);
  }

  /** Active inputs in natural order and in others; with noise and without. 1e-12 of entries of order 10. */
  @ParameterizedTest
  @MethodSource("matchings")
  void sameMoments(MomentMatching matching, double amplification) {
    for (int seed = 0; seed < 40; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      int k = 1 + seed % WHOLE;
      int[] order = random.permutation(WHOLE);
      int[] active = Arrays.copyOf(seed % 2 == 0 ? naturalOrder() : order, k);
      VectorFunction function =
          new EmbeddedFunction(new BentFunction(k, OUTPUTS, seed), OUTPUTS, WHOLE, active);
      Moments input = random.moments(WHOLE);
      Covariance noise = seed % 4 < 2 ? null : RandomGaussians.noise(random.covariance(OUTPUTS));
      compare(matching, function, input, noise, 1e-12 * Math.max(1, amplification));
    }
  }

  private static int[] naturalOrder() {
    return new int[] {0, 1, 2, 3, 4};
  }

  private static void compare(
      MomentMatching matching,
      VectorFunction function,
      Moments input,
      Covariance noise,
      double tolerance) {
    MatchingWorkspace plain = workspace(matching, function, Form.COVARIANCE);
    MatchingWorkspace root = workspace(matching, function, Form.SQUARE_ROOT);
    MatchingStatus wanted = plain.carry(input, new double[1], noise);
    assertEquals(MatchingStatus.MATCHED, wanted, plain::failure);
    boolean definite = plain.output().factor();
    MatchingStatus got = root.carry(input, new double[1], noise);
    assertEquals(
        definite ? MatchingStatus.MATCHED : MatchingStatus.OUTPUT_NOT_DEFINITE, got, root::failure);
    assertVector("mean", plain.mean(), root.mean(), tolerance, 10);
    assertMatrix(
        "unit cross-covariance, of squares", explained(plain), explained(root), tolerance, 10);
    if (definite) {
      assertFactor(root.output().lowerFactor());
      DMatrixRMaj square = new DMatrixRMaj(OUTPUTS, OUTPUTS);
      DMatrixRMaj factor = root.output().lowerFactor();
      CommonOps_DDRM.multTransB(factor, factor, square);
      assertMatrix("L L'", plain.output().covariance(), square, tolerance, 10);
      assertMatrix("covariance", square, root.output().covariance(), 1e-15, 100);
    }
    if (root.unexplained().factor()) {
      assertFactor(root.unexplained().lowerFactor());
      DMatrixRMaj rest = root.unexplained().matrix();
      assertMatrix("unexplained", plain.unexplained().matrix(), rest, tolerance, 10);
    } else {
      assertTrue(!plain.unexplained().isDefinite(), "unexplained has no factor");
    }
  }

  /** W'W: W itself turns with the factor of the input, which need not be the same. */
  private static DMatrixRMaj explained(MatchingWorkspace work) {
    DMatrixRMaj w = work.unitCrossCovariance();
    DMatrixRMaj result = new DMatrixRMaj(w.numCols, w.numCols);
    CommonOps_DDRM.multTransA(w, w, result);
    return result;
  }

  private static MatchingWorkspace workspace(
      MomentMatching matching, VectorFunction function, Form form) {
    return matching.workspace(Space.reals(WHOLE), Space.reals(OUTPUTS), function, form);
  }

  private static void assertFactor(DMatrixRMaj lower) {
    for (int i = 0; i < lower.numRows; i++) {
      assertTrue(lower.get(i, i) >= 0, "diagonal");
      for (int j = i + 1; j < lower.numCols; j++) {
        assertEquals(0, lower.get(i, j), "above the diagonal");
      }
    }
  }

  /**
   * For z = x'x in n dimensions, kappa = 3 - n and beta = 0 give the variance (3 - n) n: -10 for n = 5. The
   * workspace is as good as new afterwards.
   */
  @Test
  void aFactorThatDoesNotExistIsTold() {
    MomentMatching matching = PointMatching.of(UnscentedRule.scaled(1, 0, n -> 3 - n));
    VectorFunction length = (u, given, z) -> {
      z[0] = u[0];
      z[1] = given[0] * Arrays.stream(u).map(x -> x * x).sum() + u[1];
      z[2] = u[2];
    };
    MatchingWorkspace work = workspace(matching, length, Form.SQUARE_ROOT);
    Moments input = new RandomGaussians(1).moments(WHOLE);
    MatchingWorkspace fresh = workspace(matching, length, Form.SQUARE_ROOT);
    Outcome wanted = Outcome.of(fresh, input, new double[] {0}, null);
    Moments standard = new Moments(Space.reals(WHOLE));
    CommonOps_DDRM.setIdentity(standard.changeCovariance());
    assertEquals(MatchingStatus.OUTPUT_NOT_DEFINITE, work.carry(standard, new double[] {1}, null));
    assertTrue(work.failure().contains("negative weights"), work.failure());
    Outcome.assertSame(wanted, Outcome.of(work, input, new double[] {0}, null));
    for (MatchingStatus status : List.of(MatchingStatus.MATCHED, MatchingStatus.MATCHED)) {
      Covariance noise = RandomGaussians.noise(CommonOps_DDRM.diag(1, 30, 1));
      assertSame(status, work.carry(standard, new double[] {1}, noise));
    }
    assertTrue(work.output().factor());
  }
}

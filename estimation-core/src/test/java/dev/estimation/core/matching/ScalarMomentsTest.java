package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Functions of one Gaussian number, against closed forms. */
class ScalarMomentsTest {
  private static Outcome carry(
      MomentMatching matching, VectorFunction function, double mean, double deviation) {
    MatchingWorkspace work = matching.workspace(Space.reals(1), Space.reals(1), function);
    Gaussian input = Gaussian.independent(new double[] {mean}, new double[] {deviation});
    return Outcome.of(work, RandomGaussians.momentsOf(input));
  }

  private static Outcome carry(MomentMatching matching, ReferenceTable.Row row) {
    return carry(
        matching,
        ScalarFunction.named(row.text("function")),
        row.number("mean"),
        row.number("deviation"));
  }

  static Stream<ReferenceTable.Row> monomials() {
    return ReferenceTable.read("gaussian_scalar_moments.csv").stream()
        .filter(row -> ScalarFunction.power(row.text("function")) > 0);
  }

  /**
   * With p nodes: the mean of x^k for k to 2 p - 1, the covariance with x for k + 1, the variance
   * for 2 k. Tolerance: rounding of a sum of at most 12 terms, each carrying some 10 eps, relative
   * to the root of the second moment: 1e-13; ten times that for variances, relative to the second
   * moment.
   */
  @ParameterizedTest
  @MethodSource("monomials")
  void monomialsAreExactWhereTheDegreeSuffices(ReferenceTable.Row row) {
    int k = ScalarFunction.power(row.text("function"));
    double size = row.number("variance_f") + Math.pow(row.number("mean_f"), 2);
    for (int p = 2; p <= 12; p++) {
      Outcome got = carry(NamedMatchings.product(p), row);
      if (k <= 2 * p - 1) {
        double scale = Math.sqrt(size);
        assertWithin("mean, p = " + p, row.number("mean_f"), got.mean[0], 1e-13, scale);
      }
      if (k + 1 <= 2 * p - 1) {
        double scale = Math.sqrt(size) * row.number("deviation");
        double cross = got.cross().get(0, 0);
        assertWithin("covariance, p = " + p, row.number("covariance"), cross, 1e-13, scale);
      }
      if (2 * k <= 2 * p - 1) {
        double variance = got.covariance.get(0, 0);
        assertWithin("variance, p = " + p, row.number("variance_f"), variance, 1e-12, size);
      }
    }
  }

  /** One node fewer than the degree wants must show: a check that these checks can fail. */
  @ParameterizedTest
  @MethodSource("monomials")
  void theVarianceIsWrongWithOneNodeTooFew(ReferenceTable.Row row) {
    int k = ScalarFunction.power(row.text("function"));
    double variance = carry(NamedMatchings.product(k), row).covariance.get(0, 0);
    double deviation = row.number("deviation");
    // E x^2k exceeds the rule by k! deviation^2k (Abramowitz and Stegun 25.4.46).
    double missing = Math.pow(deviation, 2 * k);
    for (int factor = 2; factor <= k; factor++) {
      missing *= factor;
    }
    double wanted = row.number("variance_f") - missing;
    double size = row.number("variance_f") + Math.pow(row.number("mean_f"), 2);
    assertWithin("variance", wanted, variance, 1e-12, size);
    assertTrue(missing > 1e-9 * size, "what is missing is far above the tolerance");
  }

  static Stream<ReferenceTable.Row> smooth() {
    return ReferenceTable.read("gaussian_scalar_moments.csv").stream()
        .filter(row -> ScalarFunction.isSmooth(row.text("function")));
  }

  /**
   * 80 nodes. Truncation is largest for the square of x exp(-x^2/2) at s = 1.2: with the nodes of
   * numpy it was found to be 7e-9 for 40 nodes, 2e-13 for 60 and below 1e-16 for 80. Kinks such as
   * |x| are left out, since no number of nodes will do. Rounding of 80 terms: 1e-13, for variances
   * 1e-12.
   */
  @ParameterizedTest
  @MethodSource("smooth")
  void manyNodesConvergeToTheClosedForm(ReferenceTable.Row row) {
    Outcome got = carry(NamedMatchings.product(80), row);
    double size = row.number("variance_f") + Math.pow(row.number("mean_f"), 2);
    assertWithin("mean", row.number("mean_f"), got.mean[0], 1e-13, Math.sqrt(size));
    assertWithin("variance", row.number("variance_f"), got.covariance.get(0, 0), 1e-12, size);
    double scale = Math.sqrt(size) * row.number("deviation");
    assertWithin("covariance", row.number("covariance"), got.cross().get(0, 0), 1e-13, scale);
  }

  /** Algebra: kappa = 2 on one axis is the rule of 3 nodes; the difference is rounding, 1e-13. */
  @ParameterizedTest
  @MethodSource("smooth")
  void kappaTwoIsTheRuleOfThreeNodes(ReferenceTable.Row row) {
    Outcome unscented = carry(PointMatching.of(UnscentedRule.scaled(1, 0, 2)), row);
    Outcome product = carry(NamedMatchings.product(3), row);
    double size = row.number("variance_f") + Math.pow(row.number("mean_f"), 2);
    assertWithin("mean", product.mean[0], unscented.mean[0], 1e-13, Math.sqrt(size));
    double variance = product.covariance.get(0, 0);
    assertWithin("variance", variance, unscented.covariance.get(0, 0), 1e-13, size);
  }

  /**
   * Common practice: beta = 2 suits Gaussian inputs. For one input with kappa = 0 it makes the
   * variance of a square exact, whatever alpha: 4 m^2 v + beta v^2. Rounding times 2 / alpha^2.
   */
  @ParameterizedTest
  @MethodSource("squares")
  void betaTwoMakesTheVarianceOfASquareExact(ReferenceTable.Row row) {
    double size = row.number("variance_f") + Math.pow(row.number("mean_f"), 2);
    for (double alpha : new double[] {1, 0.5, 0.1, 1e-3}) {
      Outcome got = carry(PointMatching.of(UnscentedRule.scaled(alpha, 2, 0)), row);
      double tolerance = 1e-14 / (alpha * alpha);
      assertWithin("mean", row.number("mean_f"), got.mean[0], tolerance, Math.sqrt(size));
      double variance = got.covariance.get(0, 0);
      assertWithin("variance", row.number("variance_f"), variance, tolerance, size);
    }
  }

  static Stream<ReferenceTable.Row> squares() {
    return ReferenceTable.read("gaussian_scalar_moments.csv").rowsWhere("function", "x^2").stream();
  }
}

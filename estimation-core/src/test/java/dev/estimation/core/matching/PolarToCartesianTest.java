package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.ReferenceTable;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** A range and a bearing turned to x and y, against closed forms and against other programs. */
class PolarToCartesianTest {
  static Stream<ReferenceTable.Row> ruleOutputs() {
    return ReferenceTable.read("polar2d_rule_outputs.csv").stream();
  }

  /**
   * 1e-12 of the largest entry: some tens of roundings of numbers near 1, on variances from 2e-3.
   * At alpha = 1e-3 rounding is multiplied by 2e6: 1e-8.
   */
  @ParameterizedTest
  @MethodSource
  void ruleOutputs(ReferenceTable.Row row) {
    double tolerance = row.text("rule").contains("1e-3") ? 1e-8 : 1e-12;
    Outcome got = PolarCase.named(row.text("case")).carry(NamedMatchings.of(row.text("rule")));
    PolarCase.assertMoments(row, got, tolerance);
  }

  static Stream<String> cases() {
    return ReferenceTable.read("polar2d_exact.csv").stream().map(row -> row.text("case"));
  }

  /**
   * With 20 nodes the truncation, sigma^40 20! / 40! for sines and 2^40 times that for their
   * squares, is below 1e-17 at a deviation of 1 rad; what is left is rounding of numbers up to 2e3
   * times larger than the deviations: 1e-12.
   */
  @ParameterizedTest
  @MethodSource("cases")
  void manyNodesConvergeToTheClosedForm(String name) {
    PolarCase polar = PolarCase.named(name);
    Outcome got = polar.carry(NamedMatchings.product(20));
    PolarCase.assertMoments(polar.exact(), got, 1e-12);
  }

  /** More nodes than truncation needs change nothing but rounding. */
  @ParameterizedTest
  @MethodSource("cases")
  void thirtyNodesAreNoWorse(String name) {
    PolarCase polar = PolarCase.named(name);
    PolarCase.assertMoments(polar.exact(), polar.carry(NamedMatchings.product(30)), 1e-12);
  }

  /** The order of errors of the mean in the table is the order of ours; equal errors may tie. */
  @ParameterizedTest
  @MethodSource("tabulatedCases")
  void errorsOfTheMeanFallAsTheTableSays(String name) {
    PolarCase polar = PolarCase.named(name);
    List<ReferenceTable.Row> rows = new ArrayList<>(ruleRows(name));
    rows.sort(Comparator.comparingDouble((ReferenceTable.Row r) -> error(polar, mean(r)))
        .reversed());
    assertEquals("linearisation", rows.get(0).text("rule"));
    double last = Double.POSITIVE_INFINITY;
    for (ReferenceTable.Row row : rows) {
      Outcome got = polar.carry(NamedMatchings.of(row.text("rule")));
      double error = error(polar, got.mean);
      // Ties differ by rounding: 1e-14, and 1e-8 where rounding is multiplied by 2e6.
      double slack = row.text("rule").contains("1e-3") ? 1e-8 : 1e-14;
      assertTrue(error <= last + slack, () -> row + " errs by " + error);
      assertWithin("error of " + row.text("rule"), error(polar, mean(row)), error, slack, 1);
      last = error;
    }
    assertTrue(last < 1e-14, "ten nodes reach rounding");
  }

  static Stream<String> tabulatedCases() {
    return Stream.of("range_one_bearing_90", "bearing_0");
  }

  private static List<ReferenceTable.Row> ruleRows(String name) {
    return ReferenceTable.read("polar2d_rule_outputs.csv").rowsWhere("case", name);
  }

  private static double[] mean(ReferenceTable.Row row) {
    return new double[] {row.number("mean_x"), row.number("mean_y")};
  }

  private static double error(PolarCase polar, double[] mean) {
    double[] exact = mean(polar.exact());
    return Math.hypot(mean[0] - exact[0], mean[1] - exact[1]);
  }

  /**
   * Textbook example (Julier and Uhlmann 1997, constants from memory): range 1 m, deviation 0.02 m,
   * bearing 90 degrees, deviation 15 degrees. Linearisation puts the target on the arc; the centre
   * of the bent cloud lies inside, by the closed form 1 - exp(-sigma^2 / 2).
   */
  @Test
  void linearisationIsBiasedByTheSagOfTheArc() {
    PolarCase polar = PolarCase.named("range_one_bearing_90");
    double deviation = Math.toRadians(15);
    assertRelative("deviation", deviation, polar.polar().standardDeviation(1), 1e-15);
    double bias = 1 - Math.exp(-deviation * deviation / 2);
    double linear = polar.carry(Linearisation.firstOrder()).mean[1];
    // Differences of numbers near 1: a few eps.
    assertWithin("linear", 1, linear, 1e-15, 1);
    double exact = polar.exact().number("mean_y");
    assertWithin("bias", bias, linear - exact, 1e-15, 1);
    double better = polar.carry(NamedMatchings.product(5)).mean[1];
    assertTrue(Math.abs(better - exact) < 1e-8 * bias, "five nodes remove the bias");
  }

  /**
   * Common practice: with a good range and a poor bearing the true cloud is bent, and an honest
   * covariance is wide along the line of sight. There linearisation says sigma_r^2; the closed form
   * is (r^2 + sigma_r^2) (1 + exp(-2 s^2)) / 2 - r^2 exp(-s^2).
   */
  @Test
  void linearisationIsTooSureAlongTheLineOfSight() {
    PolarCase polar = PolarCase.named("bearing_0");
    double s = polar.polar().standardDeviation(1);
    double rangeVariance = polar.polar().covariance(0, 0);
    double exact = (1 + rangeVariance) * (1 + Math.exp(-2 * s * s)) / 2 - Math.exp(-s * s);
    // Cancellation of numbers near 1 down to 2.6e-3: some eps / 2.6e-3.
    assertRelative("closed form", polar.exact().number("cov_xx"), exact, 1e-12);
    double factor = exact / rangeVariance;
    assertTrue(factor > 6.4, () -> "the true variance is " + factor + " times that of the range");
    double linear = polar.carry(Linearisation.firstOrder()).covariance.get(0, 0);
    assertRelative("linearisation is short by the factor", factor, exact / linear, 1e-12);
    // The table's own value for 5 nodes is off by 9.4e-6, for 3 nodes by 2.9e-2.
    double five = polar.carry(NamedMatchings.product(5)).covariance.get(0, 0);
    assertRelative("five nodes", exact, five, 1e-5);
    double three = polar.carry(NamedMatchings.product(3)).covariance.get(0, 0);
    assertRelative("three nodes", exact, three, 3e-2);
  }
}

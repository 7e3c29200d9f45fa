package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Pendulum;
import dev.estimation.filters.testing.PlainLine;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.testing.OnceDifferentiable;
import dev.estimation.testing.PlainFunction;
import dev.estimation.testing.ReferenceTable;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Filtered means and covariances, step by step, on fixed measurement files. 1e-9 standard deviations
 * (products of them): what two programs of the same equations share after this many steps.
 */
class TraceTest extends BothForms {
  private static final double TOLERANCE = 1e-9;

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  /** The rule's name in the file, its matching, its log-likelihood. */
  static List<Arguments> pendulumRules() {
    return List.of(
        Arguments.of("EKF1", Linearisation.firstOrder(), -30.219554984195593),
        Arguments.of("EKF2", Linearisation.secondOrder(), -29.666725853934686),
        Arguments.of("UKF_a1_b0_k1", unscented(1, 0, 1), -29.630874982910235),
        Arguments.of("UKF_a1_b2_k1", unscented(1, 2, 1), -29.773747921806336),
        Arguments.of("UKF_a0.5_b2_k0", unscented(0.5, 2, 0), -29.67858132825275),
        Arguments.of("CKF", PointMatching.of(CubatureRule.degreeThree()), -29.57752290183613),
        Arguments.of("GHKF3", hermite(3), -29.630874982910235), // the same as kappa = 1 here
        Arguments.of("MS5", PointMatching.of(CubatureRule.mcNameeStenger()), -29.630874982910235),
        Arguments.of("GHKF5", hermite(5), -29.625514842472445));
  }

  private static MomentMatching unscented(double alpha, double beta, double kappa) {
    return PointMatching.of(UnscentedRule.scaled(alpha, beta, kappa));
  }

  private static MomentMatching hermite(int nodes) {
    return PointMatching.of(GaussHermiteRule.product(nodes));
  }

  /** Density 0.5 and variance 2 are the ones behind the file: they follow from its first step. */
  @ParameterizedTest
  @MethodSource("matchings")
  void constantVelocityIsTheSameForEveryMatching(MomentMatching matching) {
    Gaussian prior = Gaussian.of(new double[] {0, 1}, new double[][] {{10, 0}, {0, 4}});
    double logLikelihood = follow(
        "cv1d", "KF", matching, new PlainLine(0.5), new PlainPosition(2, 2), prior, 1, TOLERANCE);
    assertRelative("log-likelihood", -77.19600739568106, logLikelihood, 1e-12);
  }

  @ParameterizedTest
  @MethodSource("pendulumRules")
  void pendulumOverTheWholeState(String rule, MomentMatching matching, double expected) {
    Gaussian prior = Gaussian.of(new double[] {1.6, 0}, new double[][] {{0.1, 0}, {0, 0.1}});
    double logLikelihood = follow(
        "pendulum",
        rule,
        matching.overWholeInput(),
        new Pendulum(),
        new Pendulum.SideView(),
        prior,
        0.01,
        TOLERANCE);
    assertRelative("log-likelihood", expected, logLikelihood, TOLERANCE);
  }

  /**
   * The motion is linear in the second component: points along the first alone are those of the product, with
   * what the second adds summed beforehand. So the outside values of products hold here too.
   */
  @ParameterizedTest
  @MethodSource
  void pendulumLinearInItsRate(String rule, MomentMatching matching, double expected) {
    Gaussian prior = Gaussian.of(new double[] {1.6, 0}, new double[][] {{0.1, 0}, {0, 0.1}});
    double logLikelihood = follow(
        "pendulum",
        rule,
        matching,
        new Pendulum(),
        new Pendulum.SideView(),
        prior,
        0.01,
        TOLERANCE);
    assertRelative("log-likelihood", expected, logLikelihood, TOLERANCE);
  }

  static List<Arguments> pendulumLinearInItsRate() {
    MomentMatching fourthMoment = PointMatching.of(UnscentedRule.scaled(1, 0, (int n) -> 3 - n));
    return List.of(
        Arguments.of("GHKF3", hermite(3), -29.630874982910235),
        Arguments.of("GHKF3", fourthMoment, -29.630874982910235),
        Arguments.of("GHKF5", hermite(5), -29.625514842472445));
  }

  /**
   * Hessians by differences of Jacobians, good to 1e-10, and by differences of values, good to 1e-7 of
   * the angle: ten to a hundred times that after 150 steps.
   */
  @ParameterizedTest
  @MethodSource("differences")
  void pendulumByNumericalHessians(String from, double tolerance) {
    Linearisation scaled = Linearisation.secondOrder().withInputScales(1, 1);
    MomentMatching matching = (input, output, function, form) -> scaled.workspace(
        input,
        output,
        from.equals("values") ? new PlainFunction(function) : new OnceDifferentiable(function),
        form);
    Gaussian prior = Gaussian.of(new double[] {1.6, 0}, new double[][] {{0.1, 0}, {0, 0.1}});
    double logLikelihood = follow(
        "pendulum",
        "EKF2",
        matching,
        new Pendulum(),
        new Pendulum.SideView(),
        prior,
        0.01,
        tolerance);
    assertRelative("log-likelihood", -29.666725853934686, logLikelihood, tolerance);
  }

  static List<Arguments> differences() {
    return List.of(Arguments.of("values", 1e-5), Arguments.of("Jacobians", 1e-8));
  }

  private double follow(
      String trace,
      String rule,
      MomentMatching matching,
      MotionModel motion,
      SensorModel sensor,
      Gaussian prior,
      double dt,
      double tolerance) {
    List<ReferenceTable.Row> data =
        ReferenceTable.read("trace_" + trace + "_data.csv").rows();
    List<ReferenceTable.Row> expected =
        ReferenceTable.read("trace_" + trace + "_results.csv").rowsWhere("rule", rule);
    FilterPlan plan = formed(FilterPlan.of(motion, matching));
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(sensor);
    Estimate estimate = plan.start(0, prior);
    assertEquals(data.size() + 1, expected.size());
    double logLikelihood = 0;
    for (int k = 1; k <= data.size(); k++) {
      assertEquals(StepStatus.APPLIED, work.predict(estimate, k * dt));
      double[] measurement = {data.get(k - 1).number("y1")};
      assertEquals(StepStatus.APPLIED, port.update(estimate, measurement));
      logLikelihood += port.logLikelihood();
      check(expected.get(k), estimate, tolerance);
      assertWithin(
          "NIS " + k,
          expected.get(k).number("nis"),
          port.normalisedInnovationSquared(),
          tolerance,
          1 + expected.get(k).number("nis"));
    }
    return logLikelihood;
  }

  private static void check(ReferenceTable.Row row, Estimate estimate, double tolerance) {
    String step = "step " + row.text("k");
    double first = Math.sqrt(row.number("filt_P11"));
    double second = Math.sqrt(row.number("filt_P22"));
    assertWithin(step, row.number("filt_m1"), estimate.mean(0), tolerance, first);
    assertWithin(step, row.number("filt_m2"), estimate.mean(1), tolerance, second);
    assertRelative(step, row.number("filt_P11"), estimate.covariance(0, 0), tolerance);
    assertRelative(step, row.number("filt_P22"), estimate.covariance(1, 1), tolerance);
    assertWithin(
        step, row.number("filt_P12"), estimate.covariance(1, 0), tolerance, first * second);
  }
}

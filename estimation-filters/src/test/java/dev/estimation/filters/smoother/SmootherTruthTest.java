package dev.estimation.filters.smoother;

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
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Pendulum;
import dev.estimation.filters.testing.PlainLine;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.ReferenceTable;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Smoothed means and covariances against outside values, step by step. */
class SmootherTruthTest extends BothForms {
  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  static List<Arguments> pendulumRules() {
    return List.of(
        Arguments.of("EKF1", Linearisation.firstOrder()),
        Arguments.of("EKF2", Linearisation.secondOrder()),
        Arguments.of("UKF_a1_b0_k1", PointMatching.of(UnscentedRule.scaled(1, 0, 1))),
        Arguments.of("UKF_a1_b2_k1", PointMatching.of(UnscentedRule.scaled(1, 2, 1))),
        Arguments.of("UKF_a0.5_b2_k0", PointMatching.of(UnscentedRule.scaled(0.5, 2, 0))),
        Arguments.of("CKF", PointMatching.of(CubatureRule.degreeThree())),
        Arguments.of("GHKF3", PointMatching.of(GaussHermiteRule.product(3))),
        Arguments.of("GHKF5", PointMatching.of(GaussHermiteRule.product(5))),
        Arguments.of("MS5", PointMatching.of(CubatureRule.mcNameeStenger())));
  }

  /** 1e-12 relative: the rounding of 100 steps there and back. */
  @ParameterizedTest
  @MethodSource("matchings")
  void nile(MomentMatching matching) {
    checkNile(matching, "nile_kalman_P1e7.csv", "y");
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void nileWithMissingYears(MomentMatching matching) {
    checkNile(matching, "nile_kalman_missing_P1e7.csv", "y_used");
  }

  private void checkNile(MomentMatching matching, String file, String column) {
    FilterPlan plan = formed(FilterPlan.of(new PlainWalk(1, 1469.1), matching));
    FilterWorkspace work = plan.workspace();
    SensorPort gauge = work.port(new PlainPosition(1, 15099));
    Estimate level = plan.start(1871, Gaussian.of(new double[] {0}, new double[][] {{1e7}}));
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(level);
    List<ReferenceTable.Row> rows = ReferenceTable.read(file).rows();
    for (ReferenceTable.Row row : rows) {
      assertEquals(StepStatus.APPLIED, work.predict(level, row.number("year")));
      if (!row.text(column).isEmpty()) {
        double[] flow = {row.number(column)};
        assertEquals(StepStatus.APPLIED, gauge.update(level, flow));
      }
      smoother.record(work, level);
    }
    SmoothedTrack track = smoother.smooth();
    assertEquals(100, track.size());
    for (int k = 0; k < 100; k++) {
      ReferenceTable.Row row = rows.get(k);
      assertEquals(row.number("year"), track.time(k));
      assertRelative(row.text("year"), row.number("smooth_mean"), track.mean(k, 0), 1e-12);
      assertRelative(row.text("year"), row.number("smooth_var"), track.covariance(k, 0, 0), 1e-12);
    }
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void constantVelocity(MomentMatching matching) {
    Gaussian prior = Gaussian.of(new double[] {0, 1}, new double[][] {{10, 0}, {0, 4}});
    check("cv1d", "KF", matching, new PlainLine(0.5), new PlainPosition(2, 2), prior, 1);
  }

  @ParameterizedTest
  @MethodSource("pendulumRules")
  void pendulum(String rule, MomentMatching matching) {
    Gaussian prior = Gaussian.of(new double[] {1.6, 0}, new double[][] {{0.1, 0}, {0, 0.1}});
    check(
        "pendulum",
        rule,
        matching.overWholeInput(),
        new Pendulum(),
        new Pendulum.SideView(),
        prior,
        0.01);
  }

  /** 1e-9 standard deviations: what two programs of the same equations share. */
  private void check(
      String trace,
      String rule,
      MomentMatching matching,
      MotionModel motion,
      SensorModel sensor,
      Gaussian prior,
      double dt) {
    List<ReferenceTable.Row> data =
        ReferenceTable.read("trace_" + trace + "_data.csv").rows();
    List<ReferenceTable.Row> expected =
        ReferenceTable.read("trace_" + trace + "_results.csv").rowsWhere("rule", rule);
    FilterPlan plan = formed(FilterPlan.of(motion, matching));
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(sensor);
    Estimate estimate = plan.start(0, prior);
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
    for (int k = 1; k <= data.size(); k++) {
      assertEquals(StepStatus.APPLIED, work.predict(estimate, k * dt));
      double[] measurement = {data.get(k - 1).number("y1")};
      assertEquals(StepStatus.APPLIED, port.update(estimate, measurement));
      smoother.record(work, estimate);
    }
    SmoothedTrack track = smoother.smooth();
    for (int k = 0; k <= data.size(); k++) {
      checkRow(expected.get(k), track, k);
    }
  }

  private static void checkRow(ReferenceTable.Row row, SmoothedTrack track, int k) {
    String step = "step " + k;
    double a = Math.sqrt(row.number("smooth_P11"));
    double b = Math.sqrt(row.number("smooth_P22"));
    assertWithin(step, row.number("smooth_m1"), track.mean(k, 0), 1e-9, a);
    assertWithin(step, row.number("smooth_m2"), track.mean(k, 1), 1e-9, b);
    assertWithin(step, row.number("smooth_P11"), track.covariance(k, 0, 0), 1e-9, a * a);
    assertWithin(step, row.number("smooth_P12"), track.covariance(k, 0, 1), 1e-9, a * b);
    assertWithin(step, row.number("smooth_P22"), track.covariance(k, 1, 1), 1e-9, b * b);
  }
}

package dev.estimation.filters.ugly;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.testing.ExactMatrix;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Two nearly equal rows of a very accurate sensor: H = [1 1 1; 1 1 1 + d], R = d^2 I, P = I. The classical example
 * of Grewal and Andrews, <i>Kalman Filtering: Theory and Practice</i> (from memory), against values of 120 digits.
 */
class HardConditioningTest {
  private static final double[] MEAN = {0.5, -1, 2};
  private static final double[] Z = {2.5, 2.75};
  private static final int DRAWS = 400;

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  /** How the two rows come. */
  private enum Way {
    STACKED,
    ONE_AFTER_ANOTHER,
    WITH_A_PREDICTION_BETWEEN
  }

  /**
   * Six digits at d = 1e-9: 1 + d is good to 1e-7 of d, and so are the points; 1e-6 of the deviations and of
   * their products.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void squareRootFormGivesSixDigits(MomentMatching matching) {
    for (Way way : Way.values()) {
      double error = error(matching, Form.SQUARE_ROOT, way, 1e-9);
      assertTrue(error <= 1e-6, way + ": " + error);
    }
  }

  /** Updates alone carry the factor on, in this form too: right to three digits, or refused. */
  @ParameterizedTest
  @MethodSource("matchings")
  void covarianceFormIsRightOrRefuses(MomentMatching matching) {
    for (Way way : List.of(Way.STACKED, Way.ONE_AFTER_ANOTHER)) {
      for (int i = 0; i < DRAWS; i++) {
        double d = Math.pow(10, -9.5 + 2.3 * i / (DRAWS - 1));
        double error = error(matching, Form.COVARIANCE, way, d);
        assertTrue(error <= 1e-3, way + ", d = " + d + ": " + error);
      }
    }
  }

  /**
   * What the covariance form cannot do: over a prediction without noise the factor of 1e-18 beside 1 is squared,
   * and what is left passes for zero. Wrong by 60 % and not told, in 396 of 400 draws or more; known, and the
   * reason for the other form.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void covarianceFormForgetsOverAPrediction(MomentMatching matching) {
    double error = error(matching, Form.COVARIANCE, Way.WITH_A_PREDICTION_BETWEEN, 1e-9);
    assertTrue(error > 0.1, "if it is right now, say so in the page of Form: " + error);
  }

  /** Zero if the filter refused. */
  private static double error(MomentMatching matching, Form form, Way way, double d) {
    DMatrixRMaj h = new DMatrixRMaj(new double[][] {{1, 1, 1}, {1, 1, 1 + d}});
    DMatrixRMaj still = CommonOps_DDRM.identity(3);
    FilterPlan plan = BothForms.formed(
        FilterPlan.of(new Models.LinearMotion(still, new DMatrixRMaj(3, 3)), matching), form);
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, Gaussian.independent(MEAN, new double[] {1, 1, 1}));
    StepStatus status = way == Way.STACKED
        ? work.port(sensor(h, d)).update(estimate, Z)
        : rowByRow(work, estimate, h, d, way);
    if (status != StepStatus.APPLIED) {
      assertEquals(StepStatus.NOT_DEFINITE, status);
      assertEquals(Form.COVARIANCE, form, "square-root form must not refuse");
      return 0;
    }
    return distance(estimate, h, d);
  }

  private static StepStatus rowByRow(
      FilterWorkspace work, Estimate estimate, DMatrixRMaj h, double d, Way way) {
    for (int row = 0; row < 2; row++) {
      DMatrixRMaj one = CommonOps_DDRM.extractRow(h, row, null);
      StepStatus status = work.port(sensor(one, d)).update(estimate, new double[] {Z[row]});
      if (status == StepStatus.APPLIED && way == Way.WITH_A_PREDICTION_BETWEEN) {
        status = work.predict(estimate, row + 1);
      }
      if (status != StepStatus.APPLIED) {
        return status;
      }
    }
    return StepStatus.APPLIED;
  }

  private static Models.LinearSensor sensor(DMatrixRMaj h, double d) {
    DMatrixRMaj r = CommonOps_DDRM.identity(h.numRows);
    CommonOps_DDRM.scale(d * d, r);
    return new Models.LinearSensor(h, r);
  }

  /** From the exact (I + H' R^-1 H)^-1 and mean, in exact deviations. */
  private static double distance(Estimate estimate, DMatrixRMaj rows, double d) {
    ExactMatrix h = ExactMatrix.of(rows);
    ExactMatrix r = ExactMatrix.of(new double[][] {{d * d, 0}, {0, d * d}});
    ExactMatrix weighted = h.transposed().times(r.inverse());
    ExactMatrix information = ExactMatrix.of(CommonOps_DDRM.identity(3)).plus(weighted.times(h));
    ExactMatrix covariance = information.inverse();
    ExactMatrix innovation = ExactMatrix.column(Z).minus(h.times(ExactMatrix.column(MEAN)));
    ExactMatrix change = covariance.times(weighted).times(innovation);
    ExactMatrix mean = ExactMatrix.column(MEAN).plus(change);
    double largest = 0;
    for (int i = 0; i < 3; i++) {
      double deviation = Math.sqrt(covariance.get(i, i));
      // The mean moves by 1e8 deviations, and is rounded accordingly.
      double size = Math.max(deviation, Math.abs(mean.get(i, 0)));
      largest = Math.max(largest, Math.abs(estimate.mean(i) - mean.get(i, 0)) / size);
      for (int j = 0; j < 3; j++) {
        double scale = deviation * Math.sqrt(covariance.get(j, j));
        double apart = Math.abs(estimate.covariance(i, j) - covariance.get(i, j));
        largest = Math.max(largest, apart / scale);
      }
    }
    return largest;
  }
}

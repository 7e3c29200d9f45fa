package dev.estimation.filters.smoother;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.testing.Agreement;
import dev.estimation.testing.ExactMatrix;
import dev.estimation.testing.RandomGaussians;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * A vague start and very accurate later rows: the smoothed covariance is a small rest of a large one. Against the
 * covariance of all states together, of 120 digits.
 */
class HardSmootherTest {
  private static final int D = 2;
  private static final int STEPS = 3;
  private static final double VAGUE = 1e5;

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  private static DMatrixRMaj motion() {
    return new DMatrixRMaj(new double[][] {{1, 1}, {0, 1}});
  }

  private static DMatrixRMaj processNoise() {
    return CommonOps_DDRM.diag(1e-12, 4e-12);
  }

  private static DMatrixRMaj sensor() {
    return new DMatrixRMaj(new double[][] {{1, 0.5}});
  }

  private static DMatrixRMaj measurementNoise() {
    return CommonOps_DDRM.diag(1e-8);
  }

  /** The largest error of smoothed deviations and covariances, relative to exact deviations. */
  private static double error(MomentMatching matching, Form form) {
    FilterPlan plan = BothForms.formed(
        FilterPlan.of(new Models.LinearMotion(motion(), processNoise()), matching), form);
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(new Models.LinearSensor(sensor(), measurementNoise()));
    Estimate estimate =
        plan.start(0, Gaussian.independent(new double[D], new double[] {VAGUE, VAGUE}));
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
    for (int k = 1; k <= STEPS; k++) {
      assertEquals(StepStatus.APPLIED, work.predict(estimate, k), work::failure);
      assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {0}), port::failure);
      smoother.record(work, estimate);
    }
    return distance(smoother.smooth());
  }

  private static double distance(SmoothedTrack track) {
    ExactMatrix exact = information().inverse();
    double largest = 0;
    for (int k = 0; k <= STEPS; k++) {
      for (int i = 0; i < D; i++) {
        for (int j = 0; j < D; j++) {
          int row = k * D + i;
          int column = k * D + j;
          double scale = Math.sqrt(exact.get(row, row)) * Math.sqrt(exact.get(column, column));
          double apart = Math.abs(track.covariance(k, i, j) - exact.get(row, column));
          largest = Math.max(largest, apart / scale);
        }
      }
    }
    return largest;
  }

  /** The sum of A' V^-1 A over prior, motions and measurements. */
  private static ExactMatrix information() {
    int size = D * (STEPS + 1);
    DMatrixRMaj first = new DMatrixRMaj(D, size);
    CommonOps_DDRM.insert(CommonOps_DDRM.identity(D), first, 0, 0);
    ExactMatrix sum = term(first, CommonOps_DDRM.diag(VAGUE * VAGUE, VAGUE * VAGUE));
    for (int k = 1; k <= STEPS; k++) {
      DMatrixRMaj moved = new DMatrixRMaj(D, size);
      CommonOps_DDRM.insert(motion(), moved, 0, (k - 1) * D);
      DMatrixRMaj less = CommonOps_DDRM.diag(-1, -1);
      CommonOps_DDRM.insert(less, moved, 0, k * D);
      DMatrixRMaj seen = new DMatrixRMaj(1, size);
      CommonOps_DDRM.insert(sensor(), seen, 0, k * D);
      sum = sum.plus(term(moved, processNoise())).plus(term(seen, measurementNoise()));
    }
    return sum;
  }

  private static ExactMatrix term(DMatrixRMaj rows, DMatrixRMaj variance) {
    ExactMatrix a = ExactMatrix.of(rows);
    return a.transposed().times(ExactMatrix.of(variance).inverse()).times(a);
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void squareRootFormKeepsItsDigits(MomentMatching matching) {
    double error = error(matching, Form.SQUARE_ROOT);
    assertTrue(error <= 1e-4, "error " + error);
  }

  /** 1e10 less 1e10 is rounding, 1e-6, where 1e-8 should be left. */
  @ParameterizedTest
  @MethodSource("matchings")
  void covarianceFormLosesThem(MomentMatching matching) {
    double error = error(matching, Form.COVARIANCE);
    assertTrue(!(error <= 1e-2), "error " + error);
  }

  /** F F' + G P' G' = P, and next components that others determine carry nothing. */
  @Test
  void theConditionalGivesTheStateBack() {
    for (int seed = 0; seed < 200; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      int d = 1 + seed % 4;
      DMatrixRMaj root = random.matrix(2 * d, 2 * d + 1);
      if (seed % 3 == 0 && d > 1) { // the second component of the next state is twice the first
        for (int c = 0; c < root.numCols; c++) {
          root.set(1, c, 2 * root.get(0, c));
        }
      }
      DMatrixRMaj joint = new DMatrixRMaj(2 * d, 2 * d);
      CommonOps_DDRM.multTransB(root, root, joint);
      Conditional conditional = Conditional.of(root, new double[d]);
      DMatrixRMaj next = CommonOps_DDRM.extract(joint, 0, d, 0, d);
      DMatrixRMaj cross = CommonOps_DDRM.extract(joint, d, 2 * d, 0, d);
      DMatrixRMaj got = new DMatrixRMaj(d, d);
      DMatrixRMaj half = new DMatrixRMaj(d, d);
      CommonOps_DDRM.mult(conditional.gain(), next, half);
      // 1e-9: random roots of condition to 1e3, squared, and entries of order 10.
      assertMatrix(seed, cross, half);
      CommonOps_DDRM.multTransB(half, conditional.gain(), got);
      CommonOps_DDRM.multAddTransB(conditional.rest(), conditional.rest(), got);
      assertMatrix(seed, CommonOps_DDRM.extract(joint, d, 2 * d, d, 2 * d), got);
    }
  }

  private static void assertMatrix(int seed, DMatrixRMaj wanted, DMatrixRMaj got) {
    Agreement.assertMatrix("seed " + seed, wanted, got, 1e-9, 10);
  }
}

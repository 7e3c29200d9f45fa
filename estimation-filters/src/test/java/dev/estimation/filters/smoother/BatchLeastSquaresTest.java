package dev.estimation.filters.smoother;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

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
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;

/**
 * On linear models the smoother is the solution of one large least-squares problem over all states,
 * solved here by EJML's normal equations: a second route to the same numbers.
 */
class BatchLeastSquaresTest extends BothForms {
  private static final int STEPS = 6;

  /** 500 random models, seeds fixed; the matchings take turns. 1e-8: the normal equations square the condition. */
  @Test
  void smootherIsLeastSquares() {
    var matchings = Matchings.all();
    for (int seed = 0; seed < 500; seed++) {
      check(seed, matchings.get(seed % matchings.size()).getPayload());
    }
  }

  private void check(int seed, MomentMatching matching) {
    RandomGaussians random = new RandomGaussians(seed);
    int d = 1 + seed % 4;
    int m = 1 + seed % 2;
    DMatrixRMaj f = random.matrix(d, d);
    CommonOps_DDRM.scale(0.7, f);
    DMatrixRMaj q = random.covariance(d);
    DMatrixRMaj h = random.matrix(m, d);
    DMatrixRMaj r = random.covariance(m);
    Gaussian prior = random.gaussian(d);
    FilterPlan plan = formed(FilterPlan.of(new Models.LinearMotion(f, q), matching));
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(new Models.LinearSensor(h, r));
    Estimate estimate = plan.start(0, prior);
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
    LeastSquares batch = new LeastSquares(d * (STEPS + 1));
    batch.add(identity(d), null, 0, prior.mean(), prior.covariance());
    for (int k = 1; k <= STEPS; k++) {
      double[] z = random.vector(m);
      assertEquals(StepStatus.APPLIED, work.predict(estimate, k));
      assertEquals(StepStatus.APPLIED, port.update(estimate, z));
      smoother.record(work, estimate);
      batch.add(f, identity(d), k - 1, new double[d], q);
      batch.add(h, null, k, z, r);
    }
    compare(seed, smoother.smooth(), batch, d);
    for (int i = 0; i < d; i++) {
      assertEquals(estimate.mean(i), smoother.smooth().mean(STEPS, i), "last is filtered");
      for (int j = 0; j < d; j++) {
        assertEquals(estimate.covariance(i, j), smoother.smooth().covariance(STEPS, i, j));
      }
    }
  }

  private static DMatrixRMaj identity(int d) {
    return CommonOps_DDRM.identity(d);
  }

  private static void compare(int seed, SmoothedTrack track, LeastSquares batch, int d) {
    batch.solve();
    for (int k = 0; k <= STEPS; k++) {
      for (int i = 0; i < d; i++) {
        int row = k * d + i;
        double deviation = Math.sqrt(batch.covariance.get(row, row));
        String what = "model " + seed + ", step " + k;
        assertWithin(what, batch.solution.get(row, 0), track.mean(k, i), 1e-8, deviation);
        for (int j = 0; j < d; j++) {
          double other = Math.sqrt(batch.covariance.get(k * d + j, k * d + j));
          assertWithin(
              what,
              batch.covariance.get(row, k * d + j),
              track.covariance(k, i, j),
              1e-8,
              deviation * other);
        }
      }
    }
  }

  /** Sum of (b - A x)' P^-1 (b - A x) over all added terms. */
  private static final class LeastSquares {
    private final DMatrixRMaj information;
    private final DMatrixRMaj right;
    private DMatrixRMaj covariance;
    private DMatrixRMaj solution;

    LeastSquares(int size) {
      information = new DMatrixRMaj(size, size);
      right = new DMatrixRMaj(size, 1);
    }

    /** A term target ~ matrix x_step, or matrix x_step - next x_(step + 1) if there is a next. */
    void add(DMatrixRMaj matrix, DMatrixRMaj next, int step, double[] target, DMatrixRMaj p) {
      DMatrixRMaj row = new DMatrixRMaj(matrix.numRows, information.numRows);
      CommonOps_DDRM.insert(matrix, row, 0, step * matrix.numCols);
      if (next != null) {
        DMatrixRMaj negative = next.copy();
        CommonOps_DDRM.scale(-1, negative);
        CommonOps_DDRM.insert(negative, row, 0, (step + 1) * matrix.numCols);
      }
      DMatrixRMaj weight = new DMatrixRMaj(p.numRows, p.numCols);
      assertTrue(CommonOps_DDRM.invert(p, weight));
      DMatrixRMaj weighted = new DMatrixRMaj(row.numCols, p.numRows);
      CommonOps_DDRM.multTransA(row, weight, weighted);
      CommonOps_DDRM.multAdd(weighted, row, information);
      CommonOps_DDRM.multAdd(weighted, DMatrixRMaj.wrap(target.length, 1, target), right);
    }

    void solve() {
      covariance = new DMatrixRMaj(information.numRows, information.numRows);
      assertTrue(CommonOps_DDRM.invert(information, covariance));
      solution = new DMatrixRMaj(information.numRows, 1);
      CommonOps_DDRM.mult(covariance, right, solution);
    }
  }

  @Test
  void everyPredictionMustBeRecorded() {
    FilterPlan plan = formed(FilterPlan.extended(new PlainWalk(1, 1)));
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, Gaussian.of(new double[] {0}, new double[][] {{1}}));
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
    work.predict(estimate, 1);
    work.predict(estimate, 2);
    String message = assertThrows(
            IllegalStateException.class, () -> smoother.record(work, estimate))
        .getMessage();
    assertTrue(message.contains("t = 0.0 s") && message.contains("t = 1.0 s"), message);
  }

  /** A step over no time replaces the last record: the update counts, the prediction stays. */
  @Test
  void stepsOverNoTimeJoinTheLast() {
    FilterPlan plan = formed(FilterPlan.extended(new PlainWalk(1, 1)));
    FilterWorkspace work = plan.workspace();
    Estimate estimate = plan.start(0, Gaussian.of(new double[] {0}, new double[][] {{1}}));
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
    work.predict(estimate, 1);
    smoother.record(work, estimate);
    work.predict(estimate, 1);
    DMatrixRMaj one = new DMatrixRMaj(new double[][] {{1}});
    work.port(new Models.LinearSensor(one, one)).update(estimate, new double[] {3});
    smoother.record(work, estimate);
    assertEquals(2, smoother.size());
    SmoothedTrack track = smoother.smooth();
    // Prior variance 1, walk 1, noise 1: mean 3 * 2/3 at the end, 3 * 1/3 at the start.
    assertWithin("end", 2, track.mean(1, 0), 1e-15, 1);
    assertWithin("start", 1, track.mean(0, 0), 1e-15, 1);
    assertWithin("start variance", 2.0 / 3, track.covariance(0, 0, 0), 1e-15, 1);
  }
}

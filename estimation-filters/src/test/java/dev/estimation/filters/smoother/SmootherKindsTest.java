package dev.estimation.filters.smoother;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.Models;
import dev.estimation.filters.testing.PlainPosition;
import dev.estimation.filters.testing.PlainWalk;
import dev.estimation.testing.RandomGaussians;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Noise inside the motion, angles, and components known exactly. */
class SmootherKindsTest extends BothForms {
  private static final int STEPS = 8;

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  private SmoothedTrack smoothed(
      Motion motion, MomentMatching matching, Gaussian prior, SensorModel sensor, double[][] z) {
    FilterPlan plan = formed(FilterPlan.of(motion, matching));
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(sensor);
    Estimate estimate = plan.start(0, prior);
    FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(estimate);
    for (int k = 0; k < z.length; k++) {
      assertEquals(StepStatus.APPLIED, work.predict(estimate, k + 1), work::failure);
      assertEquals(StepStatus.APPLIED, port.update(estimate, z[k]), port::failure);
      smoother.record(work, estimate);
    }
    return smoother.smooth();
  }

  private static void assertSameCovariances(
      SmoothedTrack wanted, SmoothedTrack got, int dimension, double tolerance) {
    for (int k = 0; k < wanted.size(); k++) {
      for (int i = 0; i < dimension; i++) {
        for (int j = 0; j < dimension; j++) {
          double scale = Math.sqrt(wanted.covariance(k, i, i) * wanted.covariance(k, j, j));
          double expected = wanted.covariance(k, i, j);
          assertWithin("covariance at " + k, expected, got.covariance(k, i, j), tolerance, scale);
        }
      }
    }
  }

  /**
   * The motion is linear, so G Q G' added is the same. 1e-9 standard deviations: G Q G' has rank
   * 2 of 3, which multiplies the rounding of 8 steps by a condition of some 1e4.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void noiseInsideIsNoiseAdded(MomentMatching matching) {
    for (int seed = 0; seed < 10; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      DMatrixRMaj f = random.matrix(3, 3);
      CommonOps_DDRM.scale(0.7, f);
      DMatrixRMaj g = random.matrix(3, 2);
      DMatrixRMaj q = random.covariance(2);
      Gaussian prior = random.gaussian(3);
      SensorModel sensor = new Models.LinearSensor(random.matrix(1, 3), random.covariance(1));
      double[][] z = measurements(random);
      Motion outside = new Models.LinearMotion(f, product(g, q));
      SmoothedTrack wanted = smoothed(outside, matching, prior, sensor, z);
      Motion inside = new Models.LinearNoiseDriven(f, g, q);
      SmoothedTrack got = smoothed(inside, matching, prior, sensor, z);
      for (int k = 0; k <= STEPS; k++) {
        for (int i = 0; i < 3; i++) {
          double deviation = Math.sqrt(wanted.covariance(k, i, i));
          assertWithin("mean at " + k, wanted.mean(k, i), got.mean(k, i), 1e-9, deviation);
        }
      }
      assertSameCovariances(wanted, got, 3, 1e-9);
    }
  }

  private static double[][] measurements(RandomGaussians random) {
    double[][] z = new double[STEPS][];
    for (int k = 0; k < STEPS; k++) {
      z[k] = random.vector(1);
    }
    return z;
  }

  private static DMatrixRMaj product(DMatrixRMaj g, DMatrixRMaj q) {
    DMatrixRMaj half = new DMatrixRMaj(g.numRows, q.numCols);
    CommonOps_DDRM.mult(g, q, half);
    DMatrixRMaj result = new DMatrixRMaj(g.numRows, g.numRows);
    CommonOps_DDRM.multTransB(half, g, result);
    return result;
  }

  /**
   * A heading that wavers about the seam, and the same turned by 3 rad so that none comes near
   * it. The first heading is filtered on one side and smoothed to the other. 1e-12 rad: roundings
   * of numbers to pi, over 8 steps there and back.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void headingAcrossTheSeam(MomentMatching matching) {
    SmoothedTrack seam = heading(matching, Math.PI);
    SmoothedTrack away = heading(matching, Math.PI - 3);
    boolean above = false;
    boolean below = false;
    for (int k = 0; k <= STEPS; k++) {
      double mean = seam.mean(k, 0);
      above |= mean > 3;
      below |= mean < -3;
      assertTrue(mean >= -Math.PI && mean < Math.PI, "heading " + mean + " at " + k);
      double turned = Math.IEEEremainder(mean - 3, 2 * Math.PI);
      assertWithin("heading at " + k, away.mean(k, 0), turned, 1e-12, 1);
      assertWithin("rate at " + k, away.mean(k, 1), seam.mean(k, 1), 1e-12, 1);
    }
    assertTrue(above && below, "the track must cross the seam");
    assertTrue(seam.mean(0, 0) < 0, "from just before the seam to beyond it");
    assertSameCovariances(away, seam, 2, 1e-12);
  }

  private SmoothedTrack heading(MomentMatching matching, double centre) {
    double[] offsets = {0.25, 0.12, 0.2, -0.2, 0.1, -0.4, -0.35, -0.5};
    double[][] z = new double[STEPS][];
    for (int k = 0; k < STEPS; k++) {
      z[k] = new double[] {Math.IEEEremainder(centre + offsets[k], 2 * Math.PI)};
    }
    double start = Math.IEEEremainder(centre - 0.02, 2 * Math.PI);
    Gaussian prior = Gaussian.independent(new double[] {start, 0.01}, new double[] {0.3, 0.05});
    return smoothed(new Turning(), matching, prior, new Models.Compass(), z);
  }

  /** The second component is a speed of 0.5 m/s, known exactly and never disturbed. */
  @ParameterizedTest
  @MethodSource("matchings")
  void aComponentKnownExactlyIsLeftAsItIs(MomentMatching matching) {
    DMatrixRMaj f = new DMatrixRMaj(new double[][] {{1, 1}, {0, 1}});
    DMatrixRMaj q = new DMatrixRMaj(new double[][] {{1, 0}, {0, 0}});
    double[][] z = measurements(new RandomGaussians(7));
    double[][] still = new double[STEPS][];
    for (int k = 0; k < STEPS; k++) {
      still[k] = new double[] {z[k][0] - 0.5 * (k + 1)};
    }
    Gaussian prior = Gaussian.independent(new double[] {0, 0.5}, new double[] {2, 0});
    SmoothedTrack got =
        smoothed(new Models.LinearMotion(f, q), matching, prior, new PlainPosition(2, 0.3), z);
    Gaussian scalar = Gaussian.independent(new double[] {0}, new double[] {2});
    SmoothedTrack wanted =
        smoothed(new PlainWalk(1, 1), matching, scalar, new PlainPosition(1, 0.3), still);
    for (int k = 0; k <= STEPS; k++) {
      assertEquals(0.5, got.mean(k, 1));
      assertEquals(0.0, Math.abs(got.covariance(k, 1, 1)));
      assertEquals(0.0, Math.abs(got.covariance(k, 0, 1)));
      // 1e-13: roundings on numbers to 10.
      assertWithin("mean", wanted.mean(k, 0) + 0.5 * k, got.mean(k, 0), 1e-13, 10);
    }
    assertSameCovariances(wanted, got, 1, 1e-13);
  }

  /** A heading and its rate. */
  private record Turning() implements DifferentiableMotion {
    @Override
    public Space stateSpace() {
      return Space.angles(1).and(Space.reals(1));
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      next[0] = state[0] + dt * state[1];
      next[1] = state[1];
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      jacobian[0] = 1;
      jacobian[1] = dt;
      jacobian[3] = 1;
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      covariance[0] = 0.01;
      covariance[3] = 0.001;
    }
  }
}

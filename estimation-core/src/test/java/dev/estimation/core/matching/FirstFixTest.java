package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertVector;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Divergence;
import dev.estimation.core.gaussian.Fusion;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.space.Space;
import java.util.SplittableRandom;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;

/** A worked example: two radars see a ship; from their first ranges and bearings to the state of a track. */
class FirstFixTest {
  private static final Space POLAR = Space.reals(1).and(Space.angles(1));
  private static final Space PLANE = Space.reals(2);
  private static final double[] WEST = {0, 0};
  private static final double[] EAST = {8000, 1000};
  private static final double[] TRUTH = {3000, 5000};
  private static final double[] DEVIATIONS = {20, 0.01};

  /** Range (m) and bearing (rad, clockwise from north), from a station (east, north), to a position. */
  private static final VectorFunction POSITION = (z, station, x) -> {
    x[0] = station[0] + z[0] * Math.sin(z[1]);
    x[1] = station[1] + z[0] * Math.cos(z[1]);
  };

  private static Gaussian fix(double[] station, double range, double bearing) {
    Moments measured = new Moments(POLAR);
    measured.set(Gaussian.independent(POLAR, new double[] {range, bearing}, DEVIATIONS));
    MatchingWorkspace work =
        PointMatching.of(GaussHermiteRule.product(5)).workspace(POLAR, PLANE, POSITION);
    assertEquals(MatchingStatus.MATCHED, work.carry(measured, station, null), work::failure);
    return work.output().toGaussian();
  }

  private static double[] see(double[] station) {
    double east = TRUTH[0] - station[0];
    double north = TRUTH[1] - station[1];
    return new double[] {Math.hypot(east, north), Math.atan2(east, north)};
  }

  /**
   * Fixes of both against Gauss-Newton on the four stacked measurements, an independent route. Beside the bias of
   * a fix, range times variance of the bearing over 2, 0.3 m here, they differ by the curvature: a few hundredths of a deviation.
   */
  @Test
  void fusedFixesAreTheLeastSquaresOfAllMeasurements() {
    SplittableRandom random = new SplittableRandom(9);
    for (int run = 0; run < 50; run++) {
      double[] west = noisy(see(WEST), random);
      double[] east = noisy(see(EAST), random);
      Gaussian fused = Fusion.of(PLANE)
          .with(fix(WEST, west[0], west[1]))
          .with(fix(EAST, east[0], east[1]))
          .fuse();
      Gaussian batch = gaussNewton(west, east);
      Divergence divergence = Divergence.in(PLANE);
      DMatrixRMaj scale = batch.covariance();
      double mean = divergence.meanError(fused, batch, scale);
      double covariance = divergence.covarianceError(fused, batch, scale);
      assertTrue(mean < 0.1, () -> "means differ by " + mean + " deviations");
      assertTrue(covariance < 0.1, () -> "covariances differ by the fraction " + covariance);
    }
  }

  private static double[] noisy(double[] z, SplittableRandom random) {
    return new double[] {
      z[0] + DEVIATIONS[0] * random.nextGaussian(), z[1] + DEVIATIONS[1] * random.nextGaussian()
    };
  }

  private static Gaussian gaussNewton(double[] west, double[] east) {
    double[] x = TRUTH.clone();
    DMatrixRMaj information = new DMatrixRMaj(2, 2);
    for (int i = 0; i < 10; i++) {
      information.zero();
      DMatrixRMaj gradient = new DMatrixRMaj(2, 1);
      add(x, WEST, west, information, gradient);
      add(x, EAST, east, information, gradient);
      DMatrixRMaj step = new DMatrixRMaj(2, 1);
      CommonOps_DDRM.solve(information, gradient, step);
      x[0] += step.get(0);
      x[1] += step.get(1);
    }
    CommonOps_DDRM.invert(information);
    return Gaussian.of(x, information);
  }

  private static void add(
      double[] x, double[] station, double[] z, DMatrixRMaj information, DMatrixRMaj gradient) {
    double east = x[0] - station[0];
    double north = x[1] - station[1];
    double range = Math.hypot(east, north);
    double[][] rows = {{east / range, north / range}, {north / range / range, -east / range / range}
    };
    double[] rest = {z[0] - range, z[1] - Math.atan2(east, north)};
    for (int k = 0; k < 2; k++) {
      double weight = 1 / (DEVIATIONS[k] * DEVIATIONS[k]);
      for (int i = 0; i < 2; i++) {
        gradient.add(i, 0, weight * rows[k][i] * rest[k]);
        for (int j = 0; j < 2; j++) {
          information.add(i, j, weight * rows[k][i] * rows[k][j]);
        }
      }
    }
  }

  /** Position from two fixes, velocity from a reported speed and course: parts that make up a state. */
  @Test
  void aTrackStartsFromItsParts() {
    double[] west = see(WEST);
    double[] east = see(EAST);
    Gaussian first = fix(WEST, west[0], west[1]);
    Gaussian second = fix(EAST, east[0], east[1]);
    Gaussian velocity = velocity(6, Math.PI / 2);
    Gaussian state = Fusion.of(Space.reals(4))
        .with(first, 0, 1)
        .with(velocity, 2, 3)
        .with(second, 0, 1)
        .fuse();
    Gaussian position = Fusion.of(PLANE).with(first).with(second).fuse();
    assertVector(
        "position", position.mean(), new double[] {state.mean(0), state.mean(1)}, 1e-13, 1e4);
    DMatrixRMaj corner = CommonOps_DDRM.extract(state.covariance(), 0, 2, 0, 2);
    assertCovariance("position", position.covariance(), corner, 1e-11);
    DMatrixRMaj rest = CommonOps_DDRM.extract(state.covariance(), 2, 4, 2, 4);
    assertCovariance("velocity", velocity.covariance(), rest, 1e-12);
    assertEquals(0, state.covariance(0, 2));
  }

  /** Speed (m/s) and course (rad, clockwise from north): the mean is short by exp(-s^2 / 2), s = 0.2 rad. */
  private static Gaussian velocity(double speed, double course) {
    Moments reported = new Moments(POLAR);
    reported.set(
        Gaussian.independent(POLAR, new double[] {speed, course}, new double[] {0.5, 0.2}));
    MatchingWorkspace work =
        PointMatching.of(GaussHermiteRule.product(9)).workspace(POLAR, PLANE, POSITION);
    assertEquals(MatchingStatus.MATCHED, work.carry(reported, new double[2], null), work::failure);
    Gaussian velocity = work.output().toGaussian();
    assertRelative("east", speed * Math.exp(-0.02), velocity.mean(0), 1e-12);
    double across = 0.5 * (speed * speed + 0.25) * (1 - Math.exp(-0.08));
    assertRelative("variance across", across, velocity.covariance(1, 1), 1e-9);
    return velocity;
  }
}

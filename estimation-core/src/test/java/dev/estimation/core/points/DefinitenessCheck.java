package dev.estimation.core.points;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;

/** Whether variances tell the truth about {@link UnitPoints#covarianceWeightsPositive()}. */
final class DefinitenessCheck {
  private DefinitenessCheck() {}

  /**
   * Points that promise it must give no function a negative variance; for others there must be one that
   * has. Rounding: 1e-12 of the sum of the absolute terms, thousands of them at most.
   */
  static void check(UnitPoints points) {
    if (!points.covarianceWeightsPositive()) {
      assertTrue(variance(points, worst(points)) < 0, "a variance must be negative");
      return;
    }
    assertTrue(variance(points, awayFromCentre()) >= -1e-12 * points.weightAmplification());
    RandomGaussians random = new RandomGaussians(points.size());
    for (int trial = 0; trial < 20; trial++) {
      double got = variance(points, wave(random, points));
      assertTrue(got >= -1e-12 * 16 * points.weightAmplification(), () -> "variance " + got);
    }
  }

  /** A sum of two waves, from long to shorter than the distance of points: d_i is 4 at most. */
  private static VectorFunction wave(RandomGaussians random, UnitPoints points) {
    double nearest = Math.abs(points.coordinate(0));
    double[] one = random.vector(points.dimension());
    double[] two = random.vector(points.dimension());
    double[] phases = random.vector(2);
    double pitch = random.uniform(0.2, 6) / nearest;
    return (u, given, z) -> {
      z[0] = Math.sin(phases[0] + pitch * dot(one, u)) + Math.cos(phases[1] + pitch * dot(two, u));
    };
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  /** 1 at one point of negative weight and -1 opposite; without such, 1 everywhere but at the centre. */
  private static VectorFunction worst(UnitPoints points) {
    for (int i = 0; i < points.size(); i++) {
      if (points.weight(i) < 0) {
        double[] place = UnitMoments.place(points, i);
        double[] opposite = Arrays.stream(place).map(x -> 0 - x).toArray();
        return (u, given, z) -> {
          z[0] = Arrays.equals(u, place) ? 1 : Arrays.equals(u, opposite) ? -1 : 0;
        };
      }
    }
    return awayFromCentre();
  }

  private static VectorFunction awayFromCentre() {
    return (u, given, z) -> z[0] = Arrays.stream(u).allMatch(x -> x == 0) ? 0 : 1;
  }

  /** The variance of a function of N(0, I); its factor is I, so that points arrive as they are. */
  private static double variance(UnitPoints points, VectorFunction function) {
    int n = points.dimension();
    double[] ones = new double[n];
    Arrays.fill(ones, 1);
    Moments input = RandomGaussians.momentsOf(Gaussian.independent(new double[n], ones));
    MatchingWorkspace work =
        PointMatching.of(dimension -> points).workspace(Space.reals(n), Space.reals(1), function);
    assertEquals(MatchingStatus.MATCHED, work.carry(input, new double[0], null), work::failure);
    return work.output().covariance().get(0, 0);
  }
}

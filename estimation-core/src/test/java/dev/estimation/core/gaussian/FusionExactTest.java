package dev.estimation.core.gaussian;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.Rotations;
import java.util.SplittableRandom;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

/** Exact knowledge in estimates, quaternions, and what is refused. */
class FusionExactTest {
  private final RandomGaussians random = new RandomGaussians(11);

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  /** A component known exactly: the rest is conditioned on it, x = m + p01 / p11 (value - m1). */
  @Test
  void anExactComponentConditionsTheRest() {
    for (int run = 0; run < 50; run++) {
      Gaussian prior = random.gaussian(2);
      Gaussian exact = Gaussian.independent(new double[] {0.3}, new double[1]);
      Gaussian fused = Fusion.of(Space.reals(2)).with(exact, 1).with(prior).fuse();
      double gain = prior.covariance(0, 1) / prior.covariance(1, 1);
      assertWithin("known", 0.3, fused.mean(1), 1e-15, 1);
      assertWithin("given", prior.mean(0) + gain * (0.3 - prior.mean(1)), fused.mean(0), 1e-14, 10);
      double rest = prior.covariance(0, 0) - gain * prior.covariance(0, 1);
      assertRelative("variance", rest, fused.covariance(0, 0), 1e-12);
      assertWithin("no variance", 0, fused.covariance(1, 1), 1e-30, 1);
    }
  }

  /** x2 = x0 + x1 exactly in one estimate, x0 known exactly in another: both hold in the result. */
  @Test
  void exactRelationsHoldTogether() {
    for (int run = 0; run < 200; run++) {
      Gaussian inner = random.gaussian(2);
      double[] m = {inner.mean(0), inner.mean(1), inner.mean(0) + inner.mean(1)};
      DMatrixRMaj p = new DMatrixRMaj(3, 3);
      int[][] in = {{0}, {1}, {0, 1}};
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          for (int a : in[i]) {
            for (int b : in[j]) {
              p.add(i, j, inner.covariance(a, b));
            }
          }
        }
      }
      Gaussian related = Gaussian.of(m, p);
      Gaussian anchor = Gaussian.independent(new double[] {2}, new double[1]);
      Gaussian twice = Gaussian.independent(new double[] {1, 3}, new double[] {1, 0.5});
      Gaussian fused = Fusion.of(Space.reals(3))
          .with(related)
          .with(anchor, 0)
          .with(related)
          .with(twice, 1, 2)
          .fuse();
      assertWithin("x0", 2, fused.mean(0), 1e-12, 1);
      assertWithin("x2 - x1", 2, fused.mean(2) - fused.mean(1), 1e-12, 1);
      // Two of the prior of x1 given x0, and x1 twice more: 1 from 1, 1 from 3 - 2.
      double gain = inner.covariance(0, 1) / inner.covariance(0, 0);
      double given = inner.mean(1) + gain * (2 - inner.mean(0));
      double variance = inner.covariance(1, 1) - gain * inner.covariance(0, 1);
      double information = 2 / variance + 1 + 4;
      assertRelative("variance", 1 / information, fused.covariance(1, 1), 1e-10);
      assertRelative("variance", 1 / information, fused.covariance(2, 2), 1e-10);
      double mean = (2 / variance * given + 1 + 4) / information;
      assertWithin("x1", mean, fused.mean(1), 1e-11, 1 + Math.abs(mean));
    }
  }

  @Test
  void exactEstimatesThatAgreeAreOne() {
    Gaussian exact = Gaussian.independent(new double[] {1e6 / 3, -2}, new double[2]);
    Gaussian other = Gaussian.independent(new double[] {1e6 / 3 + 1e-9, -2}, new double[] {0, 1});
    Gaussian fused =
        Fusion.of(Space.reals(2)).with(exact).with(exact).with(other).fuse();
    assertVector("mean", exact.mean(), fused.mean(), 0, 1);
    assertCovariance("covariance", new DMatrixRMaj(2, 2), fused.covariance(), 0);
  }

  @Test
  void exactEstimatesThatContradictAreRefused() {
    Gaussian exact = Gaussian.independent(new double[] {5, 0}, new double[] {0, 1});
    Gaussian other = Gaussian.independent(new double[] {5.001, 0}, new double[] {0, 1});
    Fusion fusion = Fusion.of(Space.reals(2)).with(exact).with(other);
    assertRefused(fusion::fuse, "without variance", "agree", "contradicts", "0.001");
    // With the least of variances it is a disagreement of the data, and settled by weights.
    Gaussian nearly = Gaussian.independent(new double[] {5.001, 0}, new double[] {1e-9, 1});
    assertEquals(5, Fusion.of(Space.reals(2)).with(nearly).with(exact).fuse().mean(0));
  }

  /** Turns about one axis commute: attitude and bias fuse as scalars do, in any order. */
  @Test
  void turnsAboutOneAxisFuseAsScalars() {
    Space space = Space.unitQuaternion().and(Space.reals(1));
    double[] deviations = {0.1, 0.1, 0.1, 2};
    Gaussian a = Gaussian.independent(space, attitude(10, 5), deviations);
    double[] finer = {0.1, 0.1, 0.05, 1};
    Gaussian b = Gaussian.independent(space, attitude(20, 10), finer);
    double[] wanted = attitude(18, 9);
    double[] difference = new double[4];
    for (Gaussian fused : new Gaussian[] {
      Fusion.of(space).with(a).with(b).fuse(), Fusion.of(space).with(b).with(a).fuse()
    }) {
      space.difference(fused.mean(), wanted, difference);
      assertVector("mean", new double[4], difference, 1e-14, 1);
      assertRelative("turn", 0.002, fused.covariance(2, 2), 1e-13);
      assertRelative("bias", 0.8, fused.covariance(3, 3), 1e-13);
    }
    DMatrixRMaj one = new DMatrixRMaj(new double[][] {{0.0025}});
    Gaussian part =
        Fusion.of(space).with(a).withPart(attitude(20, Math.E), one, 2).fuse();
    space.difference(part.mean(), attitude(18, 5), difference);
    assertVector("part", new double[4], difference, 1e-14, 1);
  }

  private static double[] attitude(double degrees, double bias) {
    double[] q = Rotations.about(degrees, 0, 0, 1);
    return new double[] {q[0], q[1], q[2], q[3], bias};
  }

  /** To first order in the distances: reversing two attitudes 0.02 rad apart changes 1e-3 of the deviation. */
  @Test
  void attitudesFuseToFirstOrder() {
    Space space = Space.unitQuaternion();
    SplittableRandom seeds = new SplittableRandom(3);
    for (int run = 0; run < 50; run++) {
      double[] mean = Rotations.random(seeds);
      double[] other = new double[4];
      space.displace(mean, Rotations.vector(seeds, 0.02), other);
      DMatrixRMaj p = random.covariance(3);
      CommonOps_DDRM.scale(1e-4, p);
      Gaussian a = Gaussian.of(space, mean, p);
      Gaussian b = Gaussian.independent(space, other, new double[] {0.01, 0.01, 0.01});
      Gaussian ab = Fusion.of(space).with(a).with(b).fuse();
      Gaussian ba = Fusion.of(space).with(b).with(a).fuse();
      double[] difference = new double[3];
      space.difference(ab.mean(), ba.mean(), difference);
      assertVector("mean", new double[3], difference, 1e-3, 0.1);
    }
  }

  @Test
  void whatIsMissingIsNamed() {
    Fusion fusion = Fusion.of(Space.reals(3));
    Gaussian two = random.gaussian(2);
    assertRefused(fusion::fuse, "all 3", "got 0");
    assertRefused(fusion.with(two, 0, 2)::fuse, "all 3", "got 2");
    assertRefused(fusion.with(two, 0, 2).with(two, 2, 0)::fuse, "all 3", "got 2");
    Fusion turned = Fusion.of(Space.unitQuaternion());
    assertRefused(turned::fuse, "whole state", "quaternion", "about");
    Gaussian whole = turned
        .about(new double[] {1, 0, 0, 0})
        .withPart(new double[] {1, 0, 0, 0}, new DMatrixRMaj(3, 3), 2, 1, 0)
        .fuse();
    assertVector("mean", new double[] {1, 0, 0, 0}, whole.mean(), 0, 1);
  }

  @Test
  void badInputIsRefused() {
    Fusion fusion = Fusion.of(Space.reals(3));
    Gaussian two = random.gaussian(2);
    assertRefused(() -> fusion.with(two), "dimension 3", "2");
    assertRefused(() -> fusion.with(two, 0, 3), "components", "0..2", "[0, 3]");
    assertRefused(() -> fusion.with(two, 1, 1), "distinct", "[1, 1]");
    assertRefused(() -> fusion.with(two, -1, 1), "0..2", "[-1, 1]");
    assertRefused(() -> fusion.with(two, 1), "1 numbers", "components", "2");
    assertRefused(() -> fusion.with(two, new int[0]), "components", "empty");
    assertRefused(() -> fusion.about(new double[2]), "reference", "3", "2");
    double[] broken = {0, Double.NaN, 0};
    assertRefused(() -> fusion.about(broken), "reference", "NaN");
    assertRefused(() -> fusion.withPart(broken, new DMatrixRMaj(1, 1), 0), "point", "NaN");
    assertRefused(() -> fusion.withPart(new double[3], new DMatrixRMaj(2, 2), 0), "1 x 1", "2 x 2");
    DMatrixRMaj negative = new DMatrixRMaj(new double[][] {{-1}});
    assertRefused(() -> fusion.withPart(new double[3], negative, 0), "semi-definite", "-1.0");
  }

  @Test
  void badMapsAreRefused() {
    Fusion fusion = Fusion.of(Space.reals(3));
    Gaussian two = random.gaussian(2);
    Space plane = Space.reals(2);
    DMatrixRMaj map = random.matrix(2, 3);
    assertRefused(() -> fusion.withMap(random.matrix(3, 2), plane, two), "2 x 3", "3 x 2");
    assertRefused(() -> fusion.withMap(map, plane, random.gaussian(3)), "2 numbers", "3");
    map.set(1, 2, Double.POSITIVE_INFINITY);
    assertRefused(() -> fusion.withMap(map, plane, two), "map", "finite", "Infinity");
    Space turns = Space.unitQuaternion();
    assertRefused(
        () -> fusion.withMap(random.matrix(3, 3), turns, two), "linear map", "quaternion");
    assertRefused(() -> Fusion.of(turns).withMap(map, plane, two), "reals and angles", "withPart");
    assertRefused(() -> Fusion.of(turns).with(two, 0, 1), "reals and angles", "withPart");
    assertTrue(fusion.with(random.gaussian(3)).fuse().dimension() == 3, "unharmed by all this");
  }
}

package dev.estimation.core.gaussian;

import static dev.estimation.core.gaussian.PlainAlgebra.blocks;
import static dev.estimation.core.gaussian.PlainAlgebra.column;
import static dev.estimation.core.gaussian.PlainAlgebra.covariance;
import static dev.estimation.core.gaussian.PlainAlgebra.gaussian;
import static dev.estimation.core.gaussian.PlainAlgebra.inverse;
import static dev.estimation.core.gaussian.PlainAlgebra.leastSquares;
import static dev.estimation.core.gaussian.PlainAlgebra.matrix;
import static dev.estimation.core.gaussian.PlainAlgebra.stack;
import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static dev.estimation.testing.Agreement.largest;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.linear.RealMatrix;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Independent estimates, fused, against batch least squares and closed forms. */
class FusionTest {
  /** Normal equations of conditions up to a few thousand: 1e-12 leaves some hundred roundings. */
  private static final double TOLERANCE = 1e-12;

  private final RandomGaussians random = new RandomGaussians(7);

  private static void assertClose(Gaussian expected, Gaussian actual, double tolerance) {
    double[] mean = expected.mean();
    assertVector("mean", mean, actual.mean(), tolerance, Math.max(1, largest(mean)));
    assertCovariance("covariance", expected.covariance(), actual.covariance(), tolerance);
  }

  /** Two sensors that each solve for the state first, against one solution of all measurements. */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 6, 9})
  void twoSensorsAreTheBatchOfTheirMeasurements(int n) {
    for (int run = 0; run < 50; run++) {
      RealMatrix h1 = matrix(random.matrix(2 * n, n));
      RealMatrix h2 = matrix(random.matrix(2 * n + 1, n));
      RealMatrix r1 = matrix(random.covariance(2 * n));
      RealMatrix r2 = matrix(random.covariance(2 * n + 1));
      RealMatrix z1 = column(random.vector(2 * n));
      RealMatrix z2 = column(random.vector(2 * n + 1));
      Gaussian batch = leastSquares(stack(h1, h2), blocks(r1, r2), stack(z1, z2));
      Gaussian fused = Fusion.of(Space.reals(n))
          .with(leastSquares(h1, r1, z1))
          .with(leastSquares(h2, r2, z2))
          .fuse();
      assertClose(batch, fused, TOLERANCE * n);
    }
  }

  /** Whole, single components and linear maps together, against the sums of the information form. */
  @Test
  void partsAddTheirInformation() {
    for (int run = 0; run < 100; run++) {
      Gaussian whole = random.gaussian(5);
      Gaussian part = random.gaussian(2);
      Gaussian value = random.gaussian(3);
      DMatrixRMaj map = random.matrix(3, 5);
      DMatrixRMaj chosen = new DMatrixRMaj(2, 5);
      chosen.set(0, 4, 1);
      chosen.set(1, 1, 1);
      List<DMatrixRMaj> maps = List.of(CommonOps_DDRM.identity(5), chosen, map);
      List<Gaussian> values = List.of(whole, part, value);
      RealMatrix information = matrix(new DMatrixRMaj(5, 5));
      RealMatrix vector = column(new double[5]);
      for (int i = 0; i < 3; i++) {
        RealMatrix h = matrix(maps.get(i));
        RealMatrix weighted = h.transpose().multiply(inverse(covariance(values.get(i))));
        information = information.add(weighted.multiply(h));
        vector = vector.add(weighted.multiply(column(values.get(i).mean())));
      }
      RealMatrix expected = inverse(information);
      Gaussian fused = Fusion.of(Space.reals(5))
          .with(part, 4, 1)
          .withMap(map, Space.reals(3), value)
          .with(whole)
          .fuse();
      assertClose(gaussian(expected.multiply(vector), expected), fused, TOLERANCE);
    }
  }

  /** Two parts that only together make up the state: each keeps its own. */
  @Test
  void partsAloneSuffice() {
    Gaussian a = random.gaussian(2);
    Gaussian b = random.gaussian(1);
    Gaussian fused = Fusion.of(Space.reals(3)).with(a, 2, 0).with(b, 1).fuse();
    assertVector("mean", new double[] {a.mean(1), b.mean(0), a.mean(0)}, fused.mean(), 1e-15, 10);
    assertRelative("variance", a.covariance(1, 1), fused.covariance(0, 0), 1e-14);
    assertRelative("covariance", a.covariance(1, 0), fused.covariance(0, 2), 1e-13);
    assertEquals(0, fused.covariance(0, 1));
  }

  /** A hundred copies of one estimate: the same mean, a hundredth of the covariance. */
  @Test
  void copiesDivideTheCovariance() {
    Gaussian one = random.gaussian(4);
    Fusion fusion = Fusion.of(Space.reals(4));
    for (int i = 0; i < 100; i++) {
      fusion = fusion.with(one);
    }
    DMatrixRMaj hundredth = one.covariance();
    CommonOps_DDRM.scale(0.01, hundredth);
    assertClose(Gaussian.of(one.mean(), hundredth), fusion.fuse(), TOLERANCE);
  }

  /** Rounding of some tens of operations on conditions of a few hundred: 1e-12. */
  @Test
  void theOrderDoesNotMatter() {
    Space space = Space.reals(2).and(Space.angles(1));
    for (int run = 0; run < 100; run++) {
      List<Gaussian> estimates = new ArrayList<>();
      for (int i = 0; i < 6; i++) {
        double[] mean = random.vector(3);
        mean[2] = 3 + 0.1 * mean[2]; // some beyond the seam
        estimates.add(Gaussian.of(space, mean, random.covariance(3)));
      }
      Gaussian first = fuse(space, estimates, 0, 1, 2, 3, 4, 5);
      Gaussian other = fuse(space, estimates, random.permutation(6));
      assertCovariance("covariance", first.covariance(), other.covariance(), TOLERANCE);
      double[] difference = new double[3];
      space.difference(first.mean(), other.mean(), difference);
      assertVector("difference", new double[3], difference, TOLERANCE, 1);
    }
  }

  private static Gaussian fuse(Space space, List<Gaussian> estimates, int... order) {
    Fusion fusion = Fusion.of(space);
    for (int i : order) {
      fusion = fusion.with(estimates.get(i));
    }
    return fusion.fuse();
  }

  /**
   * A prior of 100 km, then x + y and x - y to 1 mm: var x = 1 / (1 / a^2 + 2 / s^2). Inverting sums of
   * information or gains would keep none of the digits: a^2 / s^2 is 1e16.
   */
  @Test
  void preciseMeasurementsOfAVagueStateKeepTheirDigits() {
    double s = 1e-3;
    Gaussian vague = Gaussian.independent(new double[] {1e4, -2e4}, new double[] {1e5, 2e5});
    Gaussian sum = Gaussian.independent(new double[] {30}, new double[] {s});
    Gaussian difference = Gaussian.independent(new double[] {10}, new double[] {s});
    Gaussian fused = Fusion.of(Space.reals(2))
        .with(vague)
        .withMap(new DMatrixRMaj(new double[][] {{1, 1}}), Space.reals(1), sum)
        .withMap(new DMatrixRMaj(new double[][] {{1, -1}}), Space.reals(1), difference)
        .fuse();
    assertRelative("var x", 1 / (1e-10 + 2 / (s * s)), fused.covariance(0, 0), 1e-12);
    assertWithin("cov", 0, fused.covariance(0, 1), 1e-12, s * s);
    // Differences of numbers up to 2e4: some roundings of these.
    assertVector("mean", new double[] {20, 10}, fused.mean(), 1e-15, 2e4);
  }

  /** One direction to 1 mm and the other left at 100 km: both deviations, seen along their axes. */
  @Test
  void oneDirectionStaysVague() {
    Gaussian vague = Gaussian.independent(new double[2], new double[] {1e5, 1e5});
    Gaussian sum = Gaussian.independent(new double[] {7}, new double[] {1e-3});
    DMatrixRMaj map = new DMatrixRMaj(new double[][] {{0.6, 0.8}});
    Gaussian fused =
        Fusion.of(Space.reals(2)).with(vague).withMap(map, Space.reals(1), sum).fuse();
    assertRelative("var x", 0.64e10, fused.covariance(0, 0), 1e-14);
    assertRelative("cov", -0.48e10, fused.covariance(0, 1), 1e-14);
    double seen = 0.6 * fused.mean(0) + 0.8 * fused.mean(1);
    assertRelative("along the axis", 7, seen, 1e-14);
  }

  /** Bearings on both sides of the seam: the weighted mean lies between them, not opposite. */
  @Test
  void anglesMeetAtTheSeam() {
    Space space = Space.angles(1);
    Gaussian a = Gaussian.independent(space, new double[] {3.1}, new double[] {0.1});
    Gaussian b = Gaussian.independent(space, new double[] {-3.1}, new double[] {0.2});
    Gaussian fused = Fusion.of(space).with(a).with(b).fuse();
    double gap = 2 * Math.PI - 6.2;
    assertWithin("mean", 3.1 + gap / 5, fused.mean(0), 1e-15, 10);
    assertRelative("variance", 1 / 125.0, fused.covariance(0, 0), 1e-14);
  }

  /** A map to an angle: the course of a ship is its heading plus a drift. */
  @Test
  void mapsMayLeadToAngles() {
    Space space = Space.angles(2);
    Gaussian heading = Gaussian.independent(new double[] {3}, new double[] {0.01});
    Gaussian drift = Gaussian.independent(new double[] {0.3}, new double[] {0.1});
    Gaussian course = Gaussian.independent(new double[] {-3}, new double[] {0.1});
    Gaussian fused = Fusion.of(space)
        .with(heading, 0)
        .with(drift, 1)
        .withMap(new DMatrixRMaj(new double[][] {{1, 1}}), Space.angles(1), course)
        .fuse();
    double innovation = 2 * Math.PI - 6.3;
    double total = 0.01 * 0.01 + 2 * 0.1 * 0.1;
    assertWithin("drift", 0.3 + innovation * 0.01 / total, fused.mean(1), 1e-14, 1);
    assertRelative("variance", 0.01 - 1e-4 / total, fused.covariance(1, 1), 1e-12);
  }
}

package dev.estimation.core.gaussian;

import static dev.estimation.core.gaussian.PlainAlgebra.column;
import static dev.estimation.core.gaussian.PlainAlgebra.covariance;
import static dev.estimation.core.gaussian.PlainAlgebra.gaussian;
import static dev.estimation.core.gaussian.PlainAlgebra.inverse;
import static dev.estimation.core.gaussian.PlainAlgebra.matrix;
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
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Fusion under unknown correlation: never too sure, never worse than the better input, closed forms. */
class CovarianceIntersectionTest {
  private final RandomGaussians random = new RandomGaussians(5);

  private static RealMatrix root(RealMatrix covariance) {
    return new CholeskyDecomposition(covariance, 1e-12, 1e-300).getL();
  }

  private static RealMatrix mixed(double w, RealMatrix a, RealMatrix b) {
    return inverse(inverse(a).scalarMultiply(w).add(inverse(b).scalarMultiply(1 - w)));
  }

  private static double measure(boolean trace, RealMatrix p) {
    return trace ? p.getTrace() : Math.log(new LUDecomposition(p).getDeterminant());
  }

  private static CovarianceIntersection method(boolean trace, int n) {
    Space space = Space.reals(n);
    return trace
        ? CovarianceIntersection.minimisingTrace(space)
        : CovarianceIntersection.minimisingDeterminant(space);
  }

  /** The textbook formula at the reported weight; no weight of a grid does better. */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void theWeightIsTheBest(boolean trace) {
    for (int run = 0; run < 200; run++) {
      int n = 1 + run % 6;
      Gaussian a = random.gaussian(n);
      Gaussian b = random.gaussian(n);
      double w = method(trace, n).weight(a, b);
      Gaussian fused = method(trace, n).fuse(a, b);
      RealMatrix p = mixed(w, covariance(a), covariance(b));
      RealMatrix mean = p.multiply(inverse(covariance(a))
          .scalarMultiply(w)
          .multiply(column(a.mean()))
          .add(inverse(covariance(b)).scalarMultiply(1 - w).multiply(column(b.mean()))));
      // Conditions of a few hundred in the inverses: 1e-12.
      Gaussian expected = gaussian(mean, p);
      assertCovariance("covariance", expected.covariance(), fused.covariance(), 1e-12);
      assertVector("mean", expected.mean(), fused.mean(), 1e-12, 10);
      double best = measure(trace, p);
      for (int i = 0; i <= 40; i++) {
        double other = measure(trace, mixed(i / 40.0, covariance(a), covariance(b)));
        assertTrue(best <= other + 1e-12 * (1 + Math.abs(other)), () -> best + " > " + other);
      }
    }
  }

  /**
   * Errors with a joint covariance [A C; C' B], C = L_A G L_B' with |G| at most 1, and exactly 1 in every
   * direction in half of the runs: the error of the fused mean never has more than P in any direction.
   */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void consistentUnderEveryCorrelation(boolean trace) {
    for (int run = 0; run < 500; run++) {
      int n = 1 + run % 6;
      Gaussian a = random.gaussian(n);
      Gaussian b = random.gaussian(n);
      double w = method(trace, n).weight(a, b);
      RealMatrix p = covariance(method(trace, n).fuse(a, b));
      RealMatrix gainA = p.multiply(inverse(covariance(a))).scalarMultiply(w);
      RealMatrix gainB = p.multiply(inverse(covariance(b))).scalarMultiply(1 - w);
      SingularValueDecomposition svd = new SingularValueDecomposition(matrix(random.matrix(n, n)));
      RealMatrix g = svd.getU().multiply(svd.getVT());
      g = run % 2 == 0 ? g : g.scalarMultiply(random.uniform(-1, 1));
      RealMatrix cross =
          root(covariance(a)).multiply(g).multiply(root(covariance(b)).transpose());
      RealMatrix half = gainA.multiply(cross).multiply(gainB.transpose());
      RealMatrix actual = gainA
          .multiply(covariance(a))
          .multiply(gainA.transpose())
          .add(gainB.multiply(covariance(b)).multiply(gainB.transpose()))
          .add(half)
          .add(half.transpose());
      RealMatrix whitening = inverse(root(p));
      RealMatrix ratio = whitening.multiply(actual).multiply(whitening.transpose());
      double largest = new EigenDecomposition(ratio.add(ratio.transpose()).scalarMultiply(0.5))
          .getRealEigenvalue(0);
      // 1 up to rounding times conditions of a few hundred.
      assertTrue(largest <= 1 + 1e-11, () -> "P is exceeded by the factor " + largest);
    }
  }

  /** The check above can fail: fusion as if independent is too sure under the same correlation. */
  @Test
  void fusionAsIfIndependentIsTooSureForEqualErrors() {
    Gaussian a = random.gaussian(3);
    Gaussian naive = Fusion.of(Space.reals(3)).with(a).with(a).fuse();
    assertRelative("half", a.covariance(1, 1) / 2, naive.covariance(1, 1), 1e-13);
    Gaussian honest = method(false, 3).fuse(a, a);
    assertCovariance("covariance", a.covariance(), honest.covariance(), 1e-13);
    assertEquals(0.5, method(false, 3).weight(a, a));
  }

  /** A = diag(v, 1), B = diag(1, v): by symmetry w = 1 / 2 and P = 2 v / (1 + v) I, whatever v. */
  @ParameterizedTest
  @ValueSource(doubles = {0.1, 1e-6, 1e-16, 1e-26})
  void mirrorImagesMeetHalfWay(double v) {
    double s = Math.sqrt(v);
    Gaussian a = Gaussian.independent(new double[] {1, 0}, new double[] {s, 1});
    Gaussian b = Gaussian.independent(new double[] {0, 1}, new double[] {1, s});
    for (boolean trace : new boolean[] {true, false}) {
      Gaussian fused = method(trace, 2).fuse(a, b);
      double variance = s * s;
      double expected = 2 * variance / (1 + variance);
      // Deviations are resolved to eps of the largest: relative to s that is eps / s.
      double tolerance = 1e-15 * (10 + 10 / s);
      assertRelative("variance", expected, fused.covariance(0, 0), tolerance);
      assertRelative("variance", expected, fused.covariance(1, 1), tolerance);
      double mean = 1 / (1 + variance);
      assertVector("mean", new double[] {mean, mean}, fused.mean(), 1e-14, 1);
    }
  }

  /** In one dimension, and wherever one is better in every direction, the better one alone is best. */
  @Test
  void theBetterOneWinsAtTheEnds() {
    Gaussian good = random.gaussian(3);
    DMatrixRMaj wide = good.covariance();
    CommonOps_DDRM.scale(1.001, wide);
    Gaussian poor = Gaussian.of(random.vector(3), wide);
    assertEquals(1, method(false, 3).weight(good, poor));
    assertEquals(0, method(true, 3).weight(poor, good));
    Gaussian fused = method(true, 3).fuse(poor, good);
    assertCovariance("covariance", good.covariance(), fused.covariance(), 1e-13);
    assertVector("mean", good.mean(), fused.mean(), 1e-13, 10);
  }

  /** What one knows exactly stays exact, the other axes are weighed: here none but the second. */
  @Test
  void exactKnowledgeIsKept() {
    Gaussian a = Gaussian.independent(new double[] {3, 1}, new double[] {0, 2});
    Gaussian b = Gaussian.independent(new double[] {2, 5}, new double[] {1, 1});
    Gaussian fused = method(false, 2).fuse(a, b);
    assertVector("mean", new double[] {3, 5}, fused.mean(), 1e-14, 5);
    assertCovariance(
        "covariance",
        Gaussian.independent(new double[2], new double[] {0, 1}).covariance(),
        fused.covariance(),
        1e-14);
    Gaussian turned = method(false, 2).fuse(b, a);
    assertVector("mean", new double[] {3, 5}, turned.mean(), 1e-14, 5);
    Gaussian point = Gaussian.independent(new double[] {3, 1}, new double[2]);
    assertEquals(point, method(true, 2).fuse(point, point, point));
    Gaussian off = Gaussian.independent(new double[] {3, 1.5}, new double[] {1, 0});
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> method(true, 2).fuse(point, off))
            .getMessage(),
        "without variance",
        "component 1",
        "0.5");
  }

  /** Exact relations in random directions, x2 = x0 + x1: held by the result, and the rest as in two dimensions. */
  @Test
  void singularInBothIsFusedOnTheRest() {
    DMatrixRMaj map = new DMatrixRMaj(new double[][] {{1, 0}, {0, 1}, {1, 1}});
    for (int run = 0; run < 100; run++) {
      Gaussian a = random.gaussian(2);
      Gaussian b = random.gaussian(2);
      Gaussian fused = method(false, 3).fuse(lifted(map, a), lifted(map, b));
      Gaussian expected = lifted(map, method(false, 2).fuse(a, b));
      assertVector("mean", expected.mean(), fused.mean(), 1e-11, 10);
      assertCovariance("covariance", expected.covariance(), fused.covariance(), 1e-11);
    }
  }

  private static Gaussian lifted(DMatrixRMaj map, Gaussian value) {
    RealMatrix h = matrix(map);
    return gaussian(
        h.multiply(column(value.mean())), h.multiply(covariance(value)).multiply(h.transpose()));
  }

  /** Pair by pair: never worse than the best of all, and honest if all errors are the same. */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void severalAreFusedOneAfterTheOther(boolean trace) {
    for (int run = 0; run < 50; run++) {
      Gaussian[] others = {random.gaussian(4), random.gaussian(4), random.gaussian(4)};
      Gaussian first = random.gaussian(4);
      double fused = measure(trace, covariance(method(trace, 4).fuse(first, others)));
      double best = measure(trace, covariance(first));
      for (Gaussian other : others) {
        best = Math.min(best, measure(trace, covariance(other)));
      }
      double bound = best;
      assertTrue(fused <= bound + 1e-12, () -> fused + " > " + bound);
    }
  }

  @Test
  void anglesMeetAtTheSeam() {
    Space space = Space.angles(2);
    Gaussian a = Gaussian.independent(space, new double[] {3.1, 0}, new double[] {0.1, 0.2});
    Gaussian b = Gaussian.independent(space, new double[] {-3.1, 0}, new double[] {0.2, 0.1});
    Gaussian fused = CovarianceIntersection.minimisingTrace(space).fuse(a, b);
    // Weight 1/2: the mean lies a fifth of the gap away from the better one.
    assertWithin("mean", 3.1 + (2 * Math.PI - 6.2) / 5, fused.mean(0), 1e-14, 1);
    assertRelative("variance", 0.016, fused.covariance(0, 0), 1e-13);
  }

  @Test
  void wrongSizesAreRefused() {
    CovarianceIntersection method = method(false, 3);
    Gaussian two = random.gaussian(2);
    Gaussian three = random.gaussian(3);
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> method.fuse(three, two))
            .getMessage(),
        "dimension 3",
        "2");
    assertThrows(IllegalArgumentException.class, () -> method.weight(two, three));
    assertEquals(three, method.fuse(three));
  }
}

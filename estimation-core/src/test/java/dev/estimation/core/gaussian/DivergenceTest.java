package dev.estimation.core.gaussian;

import static dev.estimation.core.gaussian.PlainAlgebra.column;
import static dev.estimation.core.gaussian.PlainAlgebra.covariance;
import static dev.estimation.core.gaussian.PlainAlgebra.inverse;
import static dev.estimation.core.gaussian.PlainAlgebra.matrix;
import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import org.apache.commons.math3.analysis.UnivariateFunction;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

/** Divergences of Gaussians against closed forms, their definition, and textbook formulas with inverses. */
class DivergenceTest {
  private final RandomGaussians random = new RandomGaussians(23);

  private static Divergence reals(int n) {
    return Divergence.in(Space.reals(n));
  }

  /** The textbook formula with inverse and determinants; conditions of a few hundred: 1e-12. */
  @Test
  void kullbackLeiblerIsTheTextbookFormula() {
    for (int run = 0; run < 100; run++) {
      int n = 1 + run % 7;
      Gaussian p = random.gaussian(n);
      Gaussian q = random.gaussian(n);
      RealMatrix information = inverse(covariance(q));
      RealMatrix e = column(p.mean()).subtract(column(q.mean()));
      double expected = 0.5
          * (information.multiply(covariance(p)).getTrace()
              - n
              + e.transpose().multiply(information).multiply(e).getEntry(0, 0)
              + Math.log(new LUDecomposition(covariance(q)).getDeterminant()
                  / new LUDecomposition(covariance(p)).getDeterminant()));
      assertWithin("KL", expected, reals(n).kullbackLeibler(p, q), 1e-12, 1 + expected);
    }
  }

  /** By its definition, the mean of ln p - ln q under p, integrated over 9 deviations. */
  @Test
  void kullbackLeiblerIsTheMeanLogRatio() {
    NormalDistribution p = new NormalDistribution(1, 2);
    NormalDistribution q = new NormalDistribution(0.5, 3);
    UnivariateFunction integrand = x -> p.density(x) * (p.logDensity(x) - q.logDensity(x));
    double expected = 0;
    for (int piece = -9; piece < 9; piece++) {
      GaussIntegrator integrator =
          new GaussIntegratorFactory().legendre(20, 1 + 2.0 * piece, 3 + 2.0 * piece);
      expected += integrator.integrate(integrand);
    }
    double actual = reals(1)
        .kullbackLeibler(
            Gaussian.independent(new double[] {1}, new double[] {2}),
            Gaussian.independent(new double[] {0.5}, new double[] {3}));
    assertRelative("KL", expected, actual, 1e-12);
  }

  @Test
  void kullbackLeiblerInParts() {
    Gaussian p = Gaussian.independent(new double[] {0, 0}, new double[] {1, 1});
    Gaussian moved = Gaussian.independent(new double[] {3, 4}, new double[] {1, 1});
    assertEquals(12.5, reals(2).kullbackLeibler(p, moved));
    Gaussian wide = Gaussian.independent(new double[] {0, 0}, new double[] {2, 1});
    assertWithin("KL", Math.log(2) - 0.375, reals(2).kullbackLeibler(p, wide), 1e-15, 1);
    assertWithin("KL", 1.5 - Math.log(2), reals(2).kullbackLeibler(wide, p), 1e-15, 1);
    for (int run = 0; run < 50; run++) {
      Gaussian same = random.gaussian(5);
      double zero = reals(5).kullbackLeibler(same, same);
      assertTrue(zero >= 0 && zero < 1e-14, () -> "KL(p || p) = " + zero);
    }
  }

  /** Divergences do not change under an invertible linear map, but for rounding. */
  @Test
  void unitsDoNotMatter() {
    for (int run = 0; run < 50; run++) {
      Gaussian p = random.gaussian(4);
      Gaussian q = random.gaussian(4);
      DMatrixRMaj s = random.covariance(4);
      DMatrixRMaj map = random.covariance(4);
      Divergence divergence = reals(4);
      assertWithin(
          "KL",
          divergence.kullbackLeibler(p, q),
          divergence.kullbackLeibler(mapped(map, p), mapped(map, q)),
          1e-11,
          10);
      DMatrixRMaj mappedScale = mapped(map, Gaussian.of(new double[4], s)).covariance();
      assertRelative(
          "mean error",
          divergence.meanError(p, q, s),
          divergence.meanError(mapped(map, p), mapped(map, q), mappedScale),
          1e-11);
      assertRelative(
          "covariance error",
          divergence.covarianceError(p, q, s),
          divergence.covarianceError(mapped(map, p), mapped(map, q), mappedScale),
          1e-11);
    }
  }

  private static Gaussian mapped(DMatrixRMaj map, Gaussian value) {
    RealMatrix h = matrix(map);
    return PlainAlgebra.gaussian(
        h.multiply(column(value.mean())), h.multiply(covariance(value)).multiply(h.transpose()));
  }

  /** Largest |eigenvalue| of S^-1 (A - B), by another decomposition of the unsymmetric matrix. */
  @Test
  void covarianceErrorIsTheLargestGeneralisedEigenvalue() {
    for (int run = 0; run < 50; run++) {
      Gaussian p = random.gaussian(5);
      Gaussian q = random.gaussian(5);
      DMatrixRMaj s = random.covariance(5);
      RealMatrix ratio = inverse(matrix(s)).multiply(covariance(p).subtract(covariance(q)));
      double expected = 0;
      for (double value : new EigenDecomposition(ratio).getRealEigenvalues()) {
        expected = Math.max(expected, Math.abs(value));
      }
      assertRelative("error", expected, reals(5).covarianceError(p, q, s), 1e-11);
      assertRelative("swapped", expected, reals(5).covarianceError(q, p, s), 1e-11);
    }
    Gaussian p = Gaussian.independent(new double[2], new double[] {3, 1});
    Gaussian q = Gaussian.independent(new double[2], new double[] {1, 4});
    DMatrixRMaj s = CommonOps_DDRM.diag(4, 10);
    assertWithin("error", 2, reals(2).covarianceError(p, q, s), 1e-15, 1);
  }

  @Test
  void meanErrorCountsDeviations() {
    Gaussian p = Gaussian.independent(new double[] {10, 1}, new double[] {9, 9});
    Gaussian q = Gaussian.independent(new double[] {4, 9}, new double[] {1, 1});
    assertWithin("error", 5, reals(2).meanError(p, q, CommonOps_DDRM.diag(4, 4)), 1e-15, 5);
    Space angle = Space.angles(1);
    Gaussian east = Gaussian.independent(angle, new double[] {3.1}, new double[] {0.1});
    Gaussian west = Gaussian.independent(angle, new double[] {-3.1}, new double[] {0.1});
    double gap = 2 * Math.PI - 6.2;
    double error = Divergence.in(angle).meanError(east, west, CommonOps_DDRM.diag(0.01));
    assertWithin("error", gap / 0.1, error, 1e-13, 1);
    assertWithin(
        "KL", 0.5 * error * error, Divergence.in(angle).kullbackLeibler(west, east), 1e-13, 1);
  }

  private static void assertRefused(Executable call, String... fragments) {
    assertNames(assertThrows(IllegalArgumentException.class, call).getMessage(), fragments);
  }

  @Test
  void singularAndMisshapenOnes() {
    Gaussian definite = random.gaussian(2);
    Gaussian flat = Gaussian.independent(new double[2], new double[] {1, 0});
    assertEquals(Double.POSITIVE_INFINITY, reals(2).kullbackLeibler(flat, definite));
    assertRefused(() -> reals(2).kullbackLeibler(definite, flat), "q", "definite", "pivot 2 of 2");
    assertRefused(
        () -> reals(2).meanError(flat, definite, new DMatrixRMaj(2, 2)), "scale", "pivot 1 of 2");
    assertRefused(
        () -> reals(2).covarianceError(flat, definite, new DMatrixRMaj(3, 3)), "2 x 2", "3 x 3");
    assertRefused(() -> reals(3).kullbackLeibler(definite, definite), "dimension 3", "2");
    DMatrixRMaj broken = CommonOps_DDRM.diag(1, Double.NaN);
    assertRefused(() -> reals(2).meanError(flat, definite, broken), "finite", "NaN");
  }
}

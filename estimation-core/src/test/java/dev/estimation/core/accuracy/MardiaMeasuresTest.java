package dev.estimation.core.accuracy;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertRelative;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.PolarToCartesian;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;

/** Is a mean and covariance all there is to say? */
class MardiaMeasuresTest {
  private static SampledOutput polar(double bearingDeviation, int count, long seed) {
    Gaussian input =
        Gaussian.independent(new double[] {1, Math.PI / 2}, new double[] {0.02, bearingDeviation});
    return SampledOutput.of(
        Space.reals(2),
        new PolarToCartesian(),
        new GaussianDraws(Space.reals(2), input, count, seed),
        count);
  }

  /** A good range and a bearing of 15 degrees: the cloud is a banana. */
  @Test
  void theBentCloudIsFlagged() {
    MardiaMeasures test = MardiaMeasures.of(polar(Math.toRadians(15), 1000, 1));
    assertTrue(test.rejects(1e-6), test.toString());
    assertTrue(test.skewness() > 1, test.toString());
  }

  /** A bearing of 0.1 degrees bends the cloud by less than a thousandth of its width. */
  @Test
  void theStraightCloudIsNot() {
    MardiaMeasures test = MardiaMeasures.of(polar(Math.toRadians(0.1), 1000, 1));
    assertFalse(test.rejects(0.01), test.toString());
  }

  /**
   * Affine maps of 500 samples of 3 numbers to 2, 2000 seeds, at a level of 5 %: rejected in at most 5 % of cases and 4
   * deviations by chance (1.95 %), a false alarm of 3e-5; and in 1 % at least, or the level means
   * nothing.
   */
  @Test
  void anAffineMapIsFlaggedNoOftenerThanStated() {
    RandomGaussians random = new RandomGaussians(7);
    Gaussian input = random.gaussian(3);
    DMatrixRMaj matrix = random.matrix(2, 3);
    double[] offset = random.vector(2);
    VectorFunction affine = (u, given, z) -> {
      for (int i = 0; i < 2; i++) {
        z[i] =
            offset[i] + matrix.get(i, 0) * u[0] + matrix.get(i, 1) * u[1] + matrix.get(i, 2) * u[2];
      }
    };
    int rejected = 0;
    for (int seed = 0; seed < 2000; seed++) {
      SampledOutput output = SampledOutput.of(
          Space.reals(2), affine, new GaussianDraws(Space.reals(3), input, 500, seed), 500);
      rejected += MardiaMeasures.of(output).rejects(0.05) ? 1 : 0;
    }
    double share = rejected / 2000.0;
    assertTrue(share <= 0.05 + 0.0195, "rejected " + share);
    assertTrue(share >= 0.01, "rejected " + share);
  }

  /** The definition, over all pairs, with an inverse. */
  @Test
  void asDefined() {
    int n = 200;
    SampledOutput output = polar(0.3, n, 5);
    MardiaMeasures test = MardiaMeasures.of(output);
    DMatrixRMaj covariance = output.covariance();
    CommonOps_DDRM.scale((n - 1.0) / n, covariance);
    DMatrixRMaj inverse = new DMatrixRMaj(2, 2);
    assertTrue(CommonOps_DDRM.invert(covariance, inverse));
    double[][] d = new double[n][2];
    for (int i = 0; i < n; i++) {
      output.fillDeviation(i, d[i]);
    }
    double skewness = 0;
    double kurtosis = 0;
    for (double[] a : d) {
      for (double[] b : d) {
        skewness += Math.pow(product(a, inverse, b), 3) / n / n;
      }
      kurtosis += Math.pow(product(a, inverse, a), 2) / n;
    }
    assertRelative("skewness", skewness, test.skewness(), 1e-10);
    assertRelative("kurtosis", kurtosis, test.kurtosis(), 1e-10);
  }

  private static double product(double[] a, DMatrixRMaj inverse, double[] b) {
    double sum = 0;
    for (int i = 0; i < 2; i++) {
      for (int j = 0; j < 2; j++) {
        sum += a[i] * inverse.get(i, j) * b[j];
      }
    }
    return sum;
  }

  /** Heavy tails without skewness: a Gaussian of varying width. */
  @Test
  void heavyTailsAreFlaggedByKurtosis() {
    Gaussian input = Gaussian.independent(new double[2], new double[] {1, 1});
    SampledOutput output = SampledOutput.of(
        Space.reals(1),
        (u, given, z) -> z[0] = u[0] * Math.exp(u[1] / 2),
        new GaussianDraws(Space.reals(2), input, 2000, 1),
        2000);
    MardiaMeasures test = MardiaMeasures.of(output);
    assertTrue(test.kurtosisLevel() < 1e-9, test.toString());
    assertTrue(test.kurtosis() > 4, test.toString());
  }

  @Test
  void aFlatCloudIsRefused() {
    SampledOutput output = SampledOutput.of(
        Space.reals(2),
        (u, given, z) -> {
          z[0] = u[0];
          z[1] = 3;
        },
        new GaussianDraws(
            Space.reals(1), Gaussian.independent(new double[1], new double[] {1}), 100, 1),
        100);
    assertNames(
        assertThrows(IllegalArgumentException.class, () -> MardiaMeasures.of(output))
            .getMessage(),
        "positive definite",
        "pivot 2 of 2");
  }
}

package dev.estimation.core.gaussian;

import static dev.estimation.testing.Agreement.assertCovariance;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import org.apache.commons.math3.dfp.Dfp;
import org.apache.commons.math3.dfp.DfpField;
import org.apache.commons.math3.linear.Array2DRowFieldMatrix;
import org.apache.commons.math3.linear.FieldLUDecomposition;
import org.apache.commons.math3.linear.FieldMatrix;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Fusion where doubles are hard pressed: against 80 digits, and of covariances of any rank. */
class FusionPrecisionTest {
  private static final DfpField DIGITS = new DfpField(80);

  private final RandomGaussians random = new RandomGaussians(31);

  private static FieldMatrix<Dfp> exact(DMatrixRMaj from) {
    FieldMatrix<Dfp> result = new Array2DRowFieldMatrix<>(DIGITS, from.numRows, from.numCols);
    for (int i = 0; i < from.numRows; i++) {
      for (int j = 0; j < from.numCols; j++) {
        result.setEntry(i, j, DIGITS.newDfp(from.get(i, j)));
      }
    }
    return result;
  }

  private static FieldMatrix<Dfp> inverse(FieldMatrix<Dfp> a) {
    return new FieldLUDecomposition<>(a).getSolver().getInverse();
  }

  private static FieldMatrix<Dfp> mean(Gaussian value) {
    return exact(new DMatrixRMaj(value.dimension(), 1, true, value.mean()));
  }

  private Gaussian scaled(int n, double deviation) {
    DMatrixRMaj covariance = random.covariance(n);
    CommonOps_DDRM.scale(deviation * deviation, covariance);
    return Gaussian.of(random.vector(n), covariance);
  }

  /**
   * A prior and fewer or more measurements of random directions, with deviations in a given ratio. Covariances
   * within 1e-11 (found: 1e-12). Means are numbers near 1 and deviations from 1 / root of the ratio on: rounding to
   * doubles alone is eps times that root, and 1000 times that is allowed for conditions.
   */
  @ParameterizedTest
  @ValueSource(doubles = {1, 1e4, 1e8, 1e12})
  void agreesWithEightyDigits(double ratio) {
    double root = Math.sqrt(ratio);
    for (int run = 0; run < 40; run++) {
      int n = 1 + run % 5;
      int k = 1 + run % (n + 1);
      Gaussian prior = scaled(n, root);
      Gaussian value = scaled(k, 1 / root);
      DMatrixRMaj map = random.matrix(k, n);
      FieldMatrix<Dfp> information = inverse(exact(prior.covariance()));
      FieldMatrix<Dfp> weighted =
          exact(map).transpose().multiply(inverse(exact(value.covariance())));
      FieldMatrix<Dfp> p = inverse(information.add(weighted.multiply(exact(map))));
      FieldMatrix<Dfp> m =
          p.multiply(information.multiply(mean(prior)).add(weighted.multiply(mean(value))));
      Gaussian fused = Fusion.of(Space.reals(n))
          .with(prior)
          .withMap(map, Space.reals(k), value)
          .fuse();
      for (int i = 0; i < n; i++) {
        double deviation = Math.sqrt(p.getEntry(i, i).toDouble());
        double error = m.getEntry(i, 0).subtract(DIGITS.newDfp(fused.mean(i))).toDouble();
        assertWithin("mean error", 0, error / deviation, 2e-13 * (1 + root), 1);
        for (int j = 0; j < n; j++) {
          double scale = deviation * Math.sqrt(p.getEntry(j, j).toDouble());
          double wanted = p.getEntry(i, j).toDouble();
          assertWithin("covariance", wanted, fused.covariance(i, j), 1e-11, scale);
        }
      }
    }
  }

  /** Exact in some random directions: y = m + A s, of covariance A A'. */
  private Gaussian drawn(double[] m, int rank, double deviation) {
    int n = m.length;
    DMatrixRMaj root = random.matrix(n, rank);
    CommonOps_DDRM.scale(deviation, root);
    DMatrixRMaj covariance = new DMatrixRMaj(n, n);
    CommonOps_DDRM.multOuter(root, covariance);
    DMatrixRMaj mean = new DMatrixRMaj(n, 1, true, m);
    CommonOps_DDRM.multAdd(root, random.matrix(rank, 1), mean);
    return Gaussian.of(mean.data, covariance);
  }

  /** Any ranks that agree on the truth: nothing is refused, and the order does not matter. */
  @Test
  void exactDirectionsOfAnyNumberAreFused() {
    for (int run = 0; run < 2000; run++) {
      int n = 2 + run % 5;
      double[] truth = random.vector(n);
      Gaussian a = drawn(truth, 1 + run % n, 1);
      Gaussian b = drawn(truth, 1 + run / 3 % n, 1);
      Gaussian c = drawn(truth, 1 + run / 7 % n, 1);
      Space space = Space.reals(n);
      Gaussian abc = Fusion.of(space).with(a).with(b).with(c).fuse();
      Gaussian cab = Fusion.of(space).with(c).with(a).with(b).fuse();
      // Random directions may be nearly parallel: conditions up to 1e4 or so, squared in
      // covariances.
      assertVector("mean", abc.mean(), cab.mean(), 1e-8, 1);
      double size = CommonOps_DDRM.elementMaxAbs(a.covariance());
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          assertWithin("covariance", abc.covariance(i, j), cab.covariance(i, j), 1e-9, 1 + size);
        }
      }
    }
  }

  /** The same by covariance intersection, with deviations up to 1e4 times apart. */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void exactDirectionsOfAnyNumberIntersect(boolean trace) {
    for (int run = 0; run < 2000; run++) {
      int n = 2 + run % 5;
      double[] truth = random.vector(n);
      Gaussian a = drawn(truth, 1 + run % n, 1);
      Gaussian b = drawn(truth, 1 + run / 3 % n, Math.pow(10, run % 9 - 4));
      Space space = Space.reals(n);
      CovarianceIntersection method = trace
          ? CovarianceIntersection.minimisingTrace(space)
          : CovarianceIntersection.minimisingDeterminant(space);
      Gaussian ab = method.fuse(a, b);
      Gaussian ba = method.fuse(b, a);
      for (int i = 0; i < n; i++) {
        double scale = Math.min(a.standardDeviation(i), b.standardDeviation(i));
        assertWithin("deviation", ab.standardDeviation(i), ba.standardDeviation(i), 1e-6, scale);
      }
    }
  }

  /** Where roots of 1e4 and 1e-4 in random directions round to no covariance, variances give way by roundings. */
  @Test
  void whatRoundingMakesIndefiniteIsMended() {
    DMatrixRMaj root = new DMatrixRMaj(new double[][] {{1, 0}, {1.0 / 3, 1e-9}});
    DMatrixRMaj covariance = new DMatrixRMaj(2, 2);
    CommonOps_DDRM.multOuter(root, covariance);
    covariance.set(1, 1, covariance.get(1, 1) * (1 - 4e-15));
    assertThrows(IllegalArgumentException.class, () -> Gaussian.of(new double[2], covariance));
    Gaussian mended = RoundedGaussian.of(Space.reals(2), new double[2], covariance);
    assertCovariance("covariance", covariance, mended.covariance(), 1e-14);
  }
}

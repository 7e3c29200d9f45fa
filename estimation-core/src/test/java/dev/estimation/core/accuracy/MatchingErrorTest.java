package dev.estimation.core.accuracy;

import static dev.estimation.testing.Agreement.assertNames;
import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.SpreadLinearisation;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;

/** Errors where a result is used, by hand and by a second route. */
class MatchingErrorTest {
  private static CarriedMoments scalar(double mean, double w, double u) {
    return new CarriedMoments(
        Space.reals(1), new double[] {mean}, matrix(w * w + u), matrix(1), matrix(w), matrix(u));
  }

  private static DMatrixRMaj matrix(double value) {
    return DMatrixRMaj.wrap(1, 1, new double[] {value});
  }

  /** P = 9 + 1 and 16 + 2 in place of 9 + 7: everything over a scale of 4 or 16. */
  @Test
  void predictionOfOneNumber() {
    CarriedMoments reference = scalar(5, 3, 7);
    MatchingError error = MatchingError.of(reference, scalar(6, 4, 2), Use.PREDICTION);
    assertWithin("mean", 1.0 / 4, error.mean(), 1e-15, 1);
    assertWithin("covariance", 2.0 / 16, error.covariance(), 1e-15, 1);
    assertWithin("cross-covariance", 1.0 / 4, error.crossCovariance(), 1e-15, 1);
    double divergence = (16.0 / 18 - 1 + Math.log(18.0 / 16) + 1.0 / 18) / 2;
    assertWithin("divergence", divergence, error.divergence(), 1e-14, 1);
    assertEquals(error.crossCovariance(), error.largest());
  }

  @Test
  void updateOfOneNumber() {
    CarriedMoments reference = scalar(5, 3, 7).plusNoise(matrix(2));
    CarriedMoments matched = scalar(6, 4, 2).plusNoise(matrix(2));
    MatchingError error = MatchingError.of(reference, matched, Use.UPDATE);
    assertWithin("mean", 1.0 / 3, error.mean(), 1e-15, 1);
    assertWithin("U", 5.0 / 9, error.covariance(), 1e-15, 1);
    assertWithin("W", 1.0 / 3, error.crossCovariance(), 1e-15, 1);
    double divergence = (9.0 / 4 - 1 + Math.log(4.0 / 9) + 1.0 / 4 + 1.0 / 4) / 2;
    assertWithin("divergence", divergence, error.divergence(), 1e-14, 1);
  }

  /** The update's divergence is that of the joint Gaussians of input and measurement, 3 + 2 numbers. */
  @Test
  void updateDivergenceIsThatOfTheJointDistribution() {
    RandomGaussians random = new RandomGaussians(11);
    DMatrixRMaj factor = lower(random.matrix(3, 3));
    CarriedMoments reference = random(random, factor);
    CarriedMoments matched = random(random, factor);
    double got = MatchingError.of(reference, matched, Use.UPDATE).divergence();
    double wanted = divergence(joint(reference), joint(matched), shift(reference, matched));
    assertRelative("divergence", wanted, got, 1e-11);
    assertEquals(0, MatchingError.of(reference, reference, Use.UPDATE).divergence(), 1e-15);
  }

  private static DMatrixRMaj lower(DMatrixRMaj matrix) {
    for (int i = 0; i < 3; i++) {
      for (int j = i; j < 3; j++) {
        matrix.set(i, j, i == j ? 1 + Math.abs(matrix.get(i, j)) : 0);
      }
    }
    return matrix;
  }

  private static CarriedMoments random(RandomGaussians random, DMatrixRMaj factor) {
    DMatrixRMaj w = random.matrix(3, 2);
    DMatrixRMaj unexplained = random.covariance(2);
    DMatrixRMaj covariance = unexplained.copy();
    CommonOps_DDRM.multAddTransA(w, w, covariance);
    return new CarriedMoments(Space.reals(2), random.vector(2), covariance, factor, w, unexplained);
  }

  private static DMatrixRMaj joint(CarriedMoments moments) {
    DMatrixRMaj p = new DMatrixRMaj(3, 3);
    CommonOps_DDRM.multTransB(moments.inputFactor(), moments.inputFactor(), p);
    DMatrixRMaj cross = moments.crossCovariance();
    DMatrixRMaj result = new DMatrixRMaj(5, 5);
    CommonOps_DDRM.insert(p, result, 0, 0);
    CommonOps_DDRM.insert(cross, result, 0, 3);
    CommonOps_DDRM.insert(CommonOps_DDRM.transpose(cross, null), result, 3, 0);
    CommonOps_DDRM.insert(moments.covariance(), result, 3, 3);
    return result;
  }

  private static double[] shift(CarriedMoments a, CarriedMoments b) {
    return new double[] {0, 0, 0, b.mean()[0] - a.mean()[0], b.mean()[1] - a.mean()[1]};
  }

  /** The textbook formula with an inverse and determinants. */
  private static double divergence(DMatrixRMaj wanted, DMatrixRMaj got, double[] shift) {
    DMatrixRMaj inverse = new DMatrixRMaj(5, 5);
    assertTrue(CommonOps_DDRM.invert(got, inverse));
    DMatrixRMaj product = new DMatrixRMaj(5, 5);
    CommonOps_DDRM.mult(inverse, wanted, product);
    DMatrixRMaj d = DMatrixRMaj.wrap(5, 1, shift);
    DMatrixRMaj solved = new DMatrixRMaj(5, 1);
    CommonOps_DDRM.mult(inverse, d, solved);
    return (CommonOps_DDRM.trace(product)
            - 5
            - Math.log(CommonOps_DDRM.det(product))
            + CommonOps_DDRM.dot(d, solved))
        / 2;
  }

  /** A unit of the output does not matter: A z for A of full rank has the same errors. */
  @Test
  void errorsDoNotDependOnCoordinates() {
    RandomGaussians random = new RandomGaussians(5);
    DMatrixRMaj factor = lower(random.matrix(3, 3));
    CarriedMoments reference = random(random, factor);
    CarriedMoments matched = random(random, factor);
    DMatrixRMaj a = DMatrixRMaj.wrap(2, 2, new double[] {1000, 3, -2e-3, 1e-3});
    for (Use use : Use.values()) {
      MatchingError wanted = MatchingError.of(reference, matched, use);
      MatchingError got = MatchingError.of(turned(reference, a), turned(matched, a), use);
      assertRelative("mean", wanted.mean(), got.mean(), 1e-9);
      assertRelative("covariance", wanted.covariance(), got.covariance(), 1e-9);
      assertRelative("cross", wanted.crossCovariance(), got.crossCovariance(), 1e-9);
      assertRelative("divergence", wanted.divergence(), got.divergence(), 1e-9);
    }
  }

  private static CarriedMoments turned(CarriedMoments moments, DMatrixRMaj a) {
    DMatrixRMaj mean = new DMatrixRMaj(2, 1);
    CommonOps_DDRM.mult(a, DMatrixRMaj.wrap(2, 1, moments.mean()), mean);
    DMatrixRMaj w = new DMatrixRMaj(3, 2);
    CommonOps_DDRM.multTransB(moments.unitCrossCovariance(), a, w);
    return new CarriedMoments(
        Space.reals(2),
        mean.data,
        quadratic(a, moments.covariance()),
        moments.inputFactor(),
        w,
        quadratic(a, moments.unexplained()));
  }

  private static DMatrixRMaj quadratic(DMatrixRMaj a, DMatrixRMaj p) {
    DMatrixRMaj half = new DMatrixRMaj(2, 2);
    DMatrixRMaj result = new DMatrixRMaj(2, 2);
    CommonOps_DDRM.mult(a, p, half);
    CommonOps_DDRM.multTransB(half, a, result);
    return result;
  }

  /**
   * A range of 2e7 m with a prior of 100 km: linearisation misses a bow of some 100 m to 350 m, which is 0.5 % of the
   * output's 100 km and hundreds of standard deviations of a measurement good to 1 m.
   */
  @Test
  void aFarPriorDoesNotHideCurvature() {
    VectorFunction range = (u, given, z) -> z[0] = Math.hypot(u[0], u[1]);
    Gaussian input = Gaussian.independent(new double[] {2e7, 0}, new double[] {1e5, 1e5});
    OperatingPoint point = OperatingPoint.of(input, new double[][] {{1}});
    ReferenceMoments found = new ReferenceSearch(
            ReferenceSettings.standard(), Space.reals(2), Space.reals(1), range)
        .find(point, Use.UPDATE);
    CarriedMoments reference = found.moments().plusNoise(point.noise());
    Moments moments = RandomGaussians.momentsOf(input);
    MatchingWorkspace work =
        SpreadLinearisation.firstOrder().workspace(Space.reals(2), Space.reals(1), range);
    assertEquals(
        MatchingStatus.MATCHED,
        work.carry(moments, point.given(), RandomGaussians.noise(point.noise()), Use.UPDATE));
    CarriedMoments linear = CarriedMoments.of(work, moments);
    MatchingError predicted = MatchingError.of(reference, linear, Use.PREDICTION);
    MatchingError updated = MatchingError.of(reference, linear, Use.UPDATE);
    assertTrue(predicted.largest() < 0.005, predicted.toString());
    // sigma^2 / (2 r) = 250 m is the bias, and sqrt 2 times that the deviation of what is
    // unexplained.
    assertWithin("mean", 1 / Math.sqrt(2), updated.mean(), 1e-3, 1);
    assertWithin("U", 1, updated.covariance(), 1e-4, 1);
    assertTrue(updated.divergence() > 10_000, updated.toString());
  }

  @Test
  void aScaleMustBeDefinite() {
    String message = assertThrows(
            IllegalArgumentException.class,
            () -> MatchingError.of(scalar(0, 1, 0), scalar(0, 1, 1), Use.UPDATE))
        .getMessage();
    assertNames(message, "unexplained", "noise", "pivot 1 of 1 is 0.0");
    assertEquals(
        Double.POSITIVE_INFINITY,
        MatchingError.of(scalar(0, 1, 1), scalar(0, 1, -1), Use.UPDATE).divergence());
  }
}
